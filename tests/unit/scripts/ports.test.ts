import { createServer, type Server } from 'node:net'
import { afterEach, describe, expect, it } from 'vitest'
import { choosePort, freePort } from '../../../scripts/lib/ports.mjs'

const open: Server[] = []
afterEach(async () => {
  for (const server of open.splice(0)) await new Promise((resolve) => server.close(resolve))
})
const occupy = (port: number) => new Promise<void>((resolve, reject) => {
  const server = createServer().once('error', reject)
  open.push(server)
  server.listen(port, '127.0.0.1', resolve)
})

describe('choosePort', () => {
  it('takes the usual port when it is free', async () => {
    const port = await freePort()
    expect(await choosePort(undefined, port)).toBe(port)
    expect(await choosePort('', port)).toBe(port)
  })

  it('moves on from the usual port when it is taken', async () => {
    const port = await freePort()
    await occupy(port)
    const chosen = await choosePort(undefined, port)
    expect(chosen).not.toBe(port)
    await occupy(chosen)
  })

  it('never moves on from a port that was asked for', async () => {
    const port = await freePort()
    expect(await choosePort(String(port), 1)).toBe(port)
    await occupy(port)
    await expect(choosePort(String(port), 1)).rejects.toThrow(`Port ${port} is in use`)
  })

  it.each(['http', '0', '-1', '70000', '44.5'])('refuses PORT=%s by name and says what would be right', async (asked) => {
    await expect(choosePort(asked, 4400)).rejects.toThrow(/PORT is ".*"; a port is a whole number from 1 to 65535/)
  })

  it('says so when the address is not one of this machine', async () => {
    await expect(choosePort('4400', 4400, '203.0.113.7')).rejects.toThrow(/can't be used \(EADDRNOTAVAIL\)/)
  })
})
