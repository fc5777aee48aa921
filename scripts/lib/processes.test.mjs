import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { identityOf, isAlive } from './process-identity.mjs'
import { Processes, sweepLeftovers } from './processes.mjs'

const GONE = { timeout: 25_000, interval: 20 }
/** Starts a child of its own that ignores polite signals, says its number, and stays. */
const FAMILY = `
  const { spawn } = require('node:child_process')
  const child = spawn(process.execPath, ['-e', "process.on('SIGTERM', () => {}); process.stdout.write('up'); setInterval(() => {}, 1000)"], { stdio: ['ignore', 'pipe', 'ignore'] })
  child.stdout.once('data', () => require('node:fs').writeFileSync(process.argv[1], String(child.pid)))
  setInterval(() => {}, 1000)
`

let folder
let place

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'processes-'))
  place = { root: folder, logs: join(folder, 'logs'), processesFile: join(folder, 'processes.json') }
  mkdirSync(place.logs)
})

afterEach(() => rmSync(folder, { recursive: true, force: true }))

const grandchildOf = (file) => vi.waitFor(() => identityOf(Number(readFileSync(file, 'utf8'))), GONE)

describe('processes', () => {
  it('stops what it started and whatever that has started', async () => {
    const processes = new Processes({ place })
    const file = join(folder, 'grandchild')
    const service = processes.start('family', process.execPath, ['-e', FAMILY, file])
    const grandchild = await grandchildOf(file)
    await processes.stopAll()
    await service.ended
    expect(isAlive(service.identity)).toBe(false)
    await vi.waitFor(() => expect(isAlive(grandchild)).toBe(false), GONE)
  })

  it('stops everything even when it is killed outright itself', { timeout: 30_000 }, async () => {
    const source = fileURLToPath(new URL('processes.mjs', import.meta.url))
    const file = join(folder, 'grandchild')
    const script = `
      import { Processes } from ${JSON.stringify(source)}
      const processes = new Processes({ place: ${JSON.stringify(place)} })
      processes.start('family', process.execPath, ['-e', ${JSON.stringify(FAMILY)}, ${JSON.stringify(file)}])
      setInterval(() => {}, 1000)
    `
    const run = spawn(process.execPath, ['--input-type=module', '-e', script], { stdio: 'inherit' })
    const grandchild = await grandchildOf(file)
    const [{ pid, startTicks }] = JSON.parse(readFileSync(place.processesFile, 'utf8'))
    run.kill('SIGKILL')
    await once(run, 'exit')
    await vi.waitFor(() => expect([{ pid, startTicks }, grandchild].some(isAlive)).toBe(false), GONE)
  })

  it('stops what an earlier run left behind, and nothing else', async () => {
    const left = spawn(process.execPath, ['-e', 'setInterval(() => {}, 1000)'], { detached: true, stdio: 'ignore' })
    const other = spawn(process.execPath, ['-e', 'setInterval(() => {}, 1000)'], { detached: true, stdio: 'ignore' })
    await Promise.all([once(left, 'spawn'), once(other, 'spawn')])
    const reused = identityOf(other.pid)
    writeFileSync(
      place.processesFile,
      JSON.stringify([
        { name: 'app', stopSignal: 'SIGTERM', ...identityOf(left.pid) },
        { name: 'worker', stopSignal: 'SIGTERM', pid: other.pid, startTicks: reused.startTicks - 1 },
      ]),
    )
    const ended = once(left, 'exit')
    expect(await sweepLeftovers(place.processesFile)).toEqual(['app'])
    await ended
    expect(isAlive(reused)).toBe(true)
    other.kill('SIGKILL')
    await once(other, 'exit')
  })

  it('tells a failed command in the words given, with its log', async () => {
    const processes = new Processes({ place })
    const failing = processes.run('npm', process.execPath, ['-e', "console.error('no network'); process.exit(3)"], { failure: 'No packages.' })
    await expect(failing).rejects.toMatchObject({ message: 'No packages.', log: join(place.logs, 'npm.log') })
    expect(readFileSync(join(place.logs, 'npm.log'), 'utf8')).toBe('no network\n')
    await processes.stopAll()
  })

  it('tells a command that is not there', async () => {
    const processes = new Processes({ place })
    await expect(processes.run('nothing', join(folder, 'nothing'), [], { failure: 'Not there.' })).rejects.toThrow('Not there.')
    await processes.stopAll()
  })

  it('starts nothing more once everything is being stopped', async () => {
    const processes = new Processes({ place })
    await processes.stopAll()
    expect(() => processes.start('late', process.execPath, ['-e', ''])).toThrow('Stopped.')
  })
})
