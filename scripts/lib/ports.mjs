import { createServer } from 'node:net'

/** Tried by binding it, which is the only way to know. */
export const isFree = (port) =>
  new Promise((resolve) => {
    const probe = createServer()
    probe.once('error', () => resolve(false))
    probe.listen({ port, host: '127.0.0.1', exclusive: true }, () =>
      probe.close(() => resolve(true)),
    )
  })

/** The first free port from `first` on; `onTaken` hears of every one that is in use. */
export async function freePort(first, onTaken = () => {}) {
  for (let port = first; port < first + 200 && port < 65536; port += 1) {
    if (await isFree(port)) return port
    onTaken(port)
  }
  throw new Error(`no free port from ${first} on`)
}
