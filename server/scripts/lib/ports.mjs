import { createServer } from 'node:net'

/** Whether nobody listens on a port of an address. */
export const isPortFree = (port, host = '127.0.0.1') =>
  new Promise((resolve, reject) => {
    const probe = createServer()
    probe.once('error', (fault) => (fault.code === 'EADDRINUSE' ? resolve(false) : reject(fault)))
    probe.listen(port, host, () => probe.close(() => resolve(true)))
  })

/** A port of loopback that is free now. */
export const findFreePort = () =>
  new Promise((resolve, reject) => {
    const probe = createServer()
    probe.once('error', reject)
    probe.listen(0, '127.0.0.1', () => {
      const { port } = probe.address()
      probe.close(() => resolve(port))
    })
  })
