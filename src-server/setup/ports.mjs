import { createServer } from 'node:net'

/** Whether a port can be listened on at this address right now. */
export function isPortFree(port, host = '127.0.0.1') {
  return new Promise((resolve) => {
    const probe = createServer()
    probe.once('error', () => resolve(false))
    probe.listen({ port, host, exclusive: true }, () => probe.close(() => resolve(true)))
  })
}

/** A port that the system picks; free at this moment. */
export function anyFreePort(host = '127.0.0.1') {
  return new Promise((resolve, reject) => {
    const probe = createServer()
    probe.once('error', reject)
    probe.listen({ port: 0, host, exclusive: true }, () => {
      const { port } = probe.address()
      probe.close(() => resolve(port))
    })
  })
}

/** The first of the wanted ports that is free, else any free one. Undefined entries are passed over. */
export async function firstFreePort(wanted, host = '127.0.0.1') {
  for (const port of wanted) {
    if (port !== undefined && (await isPortFree(port, host))) return port
  }
  return anyFreePort(host)
}
