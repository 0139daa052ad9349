import { readFileSync, rmSync } from 'node:fs'
import { setTimeout as pause } from 'node:timers/promises'
import { readRecord, writeRecord } from './data-folder.mjs'
import { signalGroup } from './processes.mjs'

/**
 * A start that was killed outright leaves its children running. Their process ids are written down together
 * with the moment the kernel started them (clock ticks since boot), so that a reused id is never mistaken.
 */
export function rememberChildren(file, children) {
  const lines = children.map(({ name, pid }) => ({ name, pid, startedAt: startOf(pid) }))
  writeRecord(file, { children: lines })
}

/** Forgets the list once everything was stopped in good order. */
export function forgetChildren(file) {
  rmSync(file, { force: true })
}

/** Stops what an earlier start left behind, the last started first. Gives the names of what was stopped. */
export async function stopLeftovers(file) {
  const { children = [] } = readRecord(file)
  const alive = children.filter(isStillRunning).reverse()
  for (const child of alive) {
    signalGroup(child.pid, 'SIGTERM')
    for (let waited = 0; waited < 300 && isStillRunning(child); waited++) await pause(100)
    signalGroup(child.pid, 'SIGKILL')
  }
  forgetChildren(file)
  return alive.map(({ name }) => name)
}

const isStillRunning = ({ pid, startedAt }) => startedAt !== undefined && startOf(pid) === startedAt

/** Field 22 of /proc/PID/stat; the second field is a name in brackets that may itself hold spaces. */
function startOf(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8')
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ')
    return fields[0] === 'Z' ? undefined : fields[19]
  } catch {
    return undefined // no such process, or a system without /proc: then nothing is ever taken for ours
  }
}
