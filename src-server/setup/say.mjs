import { stripVTControlCharacters } from 'node:util'

/**
 * A reason to stop that the person at the terminal can act on. Shown as one line without a stack;
 * anything else that is thrown is a defect and is shown whole.
 */
export class Refusal extends Error {
  /** @param {string} line what is wrong and how to mend it  @param {number} exitCode 1, or 2 for a wrong call */
  constructor(line, exitCode = 1) {
    super(line)
    this.name = 'Refusal'
    this.exitCode = exitCode
  }
}

// A reader that went away (a closed pipe) must not end a product that others are using.
process.stdout.on('error', () => {})
process.stderr.on('error', () => {})

/** One line of progress on standard output. */
export function say(line) {
  process.stdout.write(`${line}\n`)
}

/** One line about a fault on standard error; defects keep their stack. */
export function sayFault(fault) {
  const text = fault instanceof Refusal ? fault.message : fault instanceof Error ? fault.stack : String(fault)
  process.stderr.write(`${text}\n`)
}

/** Lines that tell a person nothing: blank ones, npm's own chatter, the rungs of a stack. */
const SAYS_NOTHING = /^$|^npm notice|^at |^\{$|^\}$|^errors: \[/

/** The last lines of a text that say something, joined for a fault line; terminal colours are taken out. */
export function lastLinesOf(text, count = 3) {
  return stripVTControlCharacters(text)
    .split('\n')
    .map((line) => line.trim())
    .filter((line) => !SAYS_NOTHING.test(line))
    .slice(-count)
    .join(' / ')
}
