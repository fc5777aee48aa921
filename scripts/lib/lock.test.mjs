import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { existsSync, mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { holderOf, takeLock, withLock } from './lock.mjs'
import { identityOf, isAlive } from './process-identity.mjs'

const MODULE = fileURLToPath(new URL('lock.mjs', import.meta.url))

let folder
let file

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'lock-'))
  file = join(folder, 'a.lock')
})

afterEach(() => rmSync(folder, { recursive: true, force: true }))

async function deadPid() {
  const child = spawn(process.execPath, ['-e', ''])
  await once(child, 'exit')
  return child.pid
}

describe('lock', () => {
  it('is refused to a second taker, who hears who holds it', () => {
    const first = takeLock(file, { what: 'npm start' })
    first.note({ address: 'http://127.0.0.1:3000' })
    expect(takeLock(file)).toMatchObject({
      taken: false,
      holder: { pid: process.pid, what: 'npm start', address: 'http://127.0.0.1:3000' },
    })
  })

  it('is free again when released, and leaves no file behind', () => {
    takeLock(file).release()
    expect(readdirSync(folder)).toEqual([])
    expect(takeLock(file).taken).toBe(true)
  })

  it('is taken over from a dead process', async () => {
    writeFileSync(file, JSON.stringify({ pid: await deadPid(), startTicks: 1 }))
    expect(holderOf(file)).toBeNull()
    expect(takeLock(file)).toMatchObject({ taken: true, stale: true })
    expect(holderOf(file)?.pid).toBe(process.pid)
  })

  it('is taken over when the number now belongs to another process', () => {
    const { pid, startTicks } = identityOf(process.pid)
    writeFileSync(file, JSON.stringify({ pid, startTicks: startTicks - 1 }))
    expect(takeLock(file)).toMatchObject({ taken: true, stale: true })
  })

  it('is taken over when its file was left half-written', () => {
    writeFileSync(file, '{"pid": 1')
    expect(takeLock(file)).toMatchObject({ taken: true, stale: true })
  })

  it('goes to exactly one of several processes that find a dead one’s at once', async () => {
    writeFileSync(file, JSON.stringify({ pid: await deadPid(), startTicks: 1 }))
    // Each keeps living until told to end, so that none can take it from one that has ended.
    const script = `
      import { takeLock } from ${JSON.stringify(MODULE)}
      process.stdout.write(String(takeLock(${JSON.stringify(file)}).taken))
      process.stdin.resume().on('end', () => process.exit())
    `
    const children = Array.from({ length: 6 }, () => spawn(process.execPath, ['--input-type=module', '-e', script], { stdio: ['pipe', 'pipe', 'inherit'] }))
    const said = await Promise.all(children.map(async (child) => String((await once(child.stdout, 'data'))[0])))
    for (const child of children) child.stdin.end()
    await Promise.all(children.map((child) => once(child, 'exit')))
    expect(said.filter((taken) => taken === 'true')).toHaveLength(1)
  })

  it('makes a second worker wait until the first is done', async () => {
    const order = []
    let finish
    const first = withLock(file, () => new Promise((resolve) => (finish = resolve)).then(() => order.push('first')))
    const second = withLock(file, () => order.push('second'), { onWait: () => finish(), everyMs: 1 })
    await Promise.all([first, second])
    expect(order).toEqual(['first', 'second'])
    expect(existsSync(file)).toBe(false)
  })
})

describe('process identity', () => {
  it('tells a process that has ended from one that lives', async () => {
    const child = spawn(process.execPath, ['-e', 'process.stdin.resume()'])
    await once(child, 'spawn')
    const identity = identityOf(child.pid)
    expect(isAlive(identity)).toBe(true)
    expect(isAlive({ ...identity, startTicks: identity.startTicks + 1 })).toBe(false)
    child.stdin.end()
    await once(child, 'exit')
    expect(isAlive(identity)).toBe(false)
  })
})
