import { once } from 'node:events'
import { createServer } from 'node:net'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { anyFreePort, appPort, isPortFree, nextFreePort } from './ports.mjs'

let holder
let takenPort

beforeEach(async () => {
  holder = createServer().listen(0, '127.0.0.1')
  await once(holder, 'listening')
  takenPort = holder.address().port
})

afterEach(() => holder.close())

describe('ports', () => {
  it('knows a taken port from a free one', async () => {
    expect(await isPortFree(takenPort)).toBe(false)
    expect(await isPortFree(await anyFreePort())).toBe(true)
  })

  it('passes over a taken port to a later one', async () => {
    expect(await nextFreePort(takenPort)).toBeGreaterThan(takenPort)
  })

  it('gives another port when the wanted one is taken', async () => {
    const port = await anyFreePort(takenPort)
    expect(port).not.toBe(takenPort)
    expect(await isPortFree(port)).toBe(true)
  })

  it('moves the app from the usual port when it is taken, and says so', async () => {
    const { port, moved } = await appPort({ asked: undefined, usual: takenPort })
    expect(port).not.toBe(takenPort)
    expect(moved).toBe(true)
  })

  it('never moves the app from a port that was asked for', async () => {
    await expect(appPort({ asked: String(takenPort), usual: 3000 })).rejects.toThrow(`Port ${takenPort} on 127.0.0.1 is taken`)
    const free = await anyFreePort()
    expect(await appPort({ asked: String(free), usual: 3000 })).toEqual({ port: free, moved: false })
  })

  it.each(['abc', '0', '70000', '80.5'])('refuses PORT=%s', async (asked) => {
    await expect(appPort({ asked, usual: 3000 })).rejects.toThrow(`PORT is "${asked}", which is not a port.`)
  })
})
