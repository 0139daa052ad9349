import { createServer, connect } from 'node:net'
import type { AddressInfo, Socket } from 'node:net'

/** A line to the database that a test can cut and mend, as if the server had gone away and come back. */
export interface CuttableLine {
  /** Address of the database through the line. */
  readonly url: string
  /** Breaks every connection and takes no new one. */
  cut(): void
  mend(): void
  close(): Promise<void>
}

export async function cuttableLineTo(databaseUrl: string): Promise<CuttableLine> {
  const target = new URL(databaseUrl)
  const sockets = new Set<Socket>()
  let isCut = false
  const server = createServer((near) => {
    if (isCut) return near.destroy()
    const far = connect(Number(target.port), target.hostname)
    for (const socket of [near, far]) {
      sockets.add(socket)
      socket.on('error', () => {}) // a cut line ends in resets on both sides, as meant
      socket.on('close', () => {
        sockets.delete(socket)
        near.destroy()
        far.destroy()
      })
    }
    near.pipe(far).pipe(near)
  })
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
  const url = new URL(databaseUrl)
  url.port = String((server.address() as AddressInfo).port)
  const cut = () => {
    isCut = true
    for (const socket of sockets) socket.destroy()
  }
  return {
    url: url.href,
    cut,
    mend: () => {
      isCut = false
    },
    close: () => {
      cut()
      return new Promise((resolve) => server.close(() => resolve()))
    },
  }
}
