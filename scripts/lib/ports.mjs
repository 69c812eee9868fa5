import { createServer } from 'node:net'
import { Refusal } from './steps.mjs'

/**
 * @param {number} port 0 for any
 * @param {string} host
 * @returns {Promise<number>} the port that was bound and released; 0 when it is taken
 */
const tryPort = (port, host) =>
  new Promise((resolve, reject) => {
    const server = createServer()
    server.once('error', (/** @type {NodeJS.ErrnoException} */ error) => (error.code === 'EADDRINUSE' ? resolve(0) : reject(error)))
    server.listen(port, host, () => {
      const address = server.address()
      server.close(() => resolve(typeof address === 'object' && address ? address.port : 0))
    })
  })

/** A TCP port that nobody listens on at this moment. */
export const freePort = (host = '127.0.0.1') => tryPort(0, host)

/**
 * @param {string | undefined} asked what the person set as PORT, if anything
 * @param {number} usual
 * @param {string} [host]
 * @returns {Promise<number>} the port asked for; else the usual one, or the next free one above it
 * @throws {Refusal} when PORT is no port, may not be bound, or is taken
 */
export async function choosePort(asked, usual, host = '127.0.0.1') {
  if (asked !== undefined && asked !== '') {
    const port = Number(asked)
    if (!Number.isInteger(port) || port < 1 || port > 65535) throw new Refusal(`PORT is "${asked}"; a port is a whole number from 1 to 65535, for example 4400.`)
    const got = await tryPort(port, host).catch((/** @type {NodeJS.ErrnoException} */ error) => {
      throw new Refusal(`Port ${port} on ${host} can't be used (${error.code}). Set another PORT or HOST, or leave them unset.`)
    })
    if (!got) throw new Refusal(`Port ${port} is in use by another program. Stop that program, set another PORT, or leave PORT unset to have a free one chosen.`)
    return port
  }
  for (let port = usual; port < usual + 50; port++) if (await tryPort(port, host)) return port
  return freePort(host)
}
