import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { afterEach, beforeEach, expect, it, vi } from 'vitest'
import { isAlive } from './process-identity.mjs'

const SLOW = 30_000
const here = (name) => JSON.stringify(fileURLToPath(new URL(name, import.meta.url)))

let folder

beforeEach(() => (folder = mkdtempSync(join(tmpdir(), 'session-'))))
afterEach(() => rmSync(folder, { recursive: true, force: true }))

const STAYS = `run.running = true
run.lock.note({ running: true, address: 'http://127.0.0.1:3000' })
await new Promise(() => setInterval(() => {}, 1000))`

/** A run that starts one service and stays, or does what `work` says. */
function session(work = STAYS, { throughNpm = false } = {}) {
  const file = join(folder, `run-${Math.random()}.mjs`)
  writeFileSync(
    file,
    `import { runSession } from ${here('session.mjs')}
import { placeOf } from ${here('place.mjs')}
import { Failure } from ${here('failure.mjs')}
await runSession({ place: placeOf('start', ${JSON.stringify(folder)}), what: 'Hoopwright (npm start)' }, async (run) => {
  run.processes.start('service', process.execPath, ['-e', 'setInterval(() => {}, 1000)'])
  ${work}
})`,
  )
  // Two commands, so that the shell stays between npm and the run, as some shells do anyway.
  writeFileSync(join(folder, 'package.json'), JSON.stringify({ scripts: { start: `node ${file}; exit $?` } }))
  const { npm_lifecycle_event: _, ...env } = process.env
  const child = throughNpm
    ? spawn('npm', ['start', '--silent'], { cwd: folder, stdio: ['ignore', 'pipe', 'pipe'], env })
    : spawn(process.execPath, [file], { stdio: ['ignore', 'pipe', 'pipe'], env })
  let said = ''
  for (const stream of [child.stdout, child.stderr]) stream.setEncoding('utf8').on('data', (text) => (said += text))
  return { child, said: () => said, ended: once(child, 'close').then(([code]) => code) }
}

const lockFile = () => join(folder, '.local', 'start.lock')
const runningService = () =>
  vi.waitFor(
    () => {
      expect(JSON.parse(readFileSync(lockFile(), 'utf8'))).toMatchObject({ running: true })
      return JSON.parse(readFileSync(join(folder, '.local', 'start.processes.json'), 'utf8'))[0]
    },
    { timeout: SLOW, interval: 20 },
  )

it.each(['SIGINT', 'SIGTERM', 'SIGHUP'])('stops everything on %s, once it runs a normal end', { timeout: SLOW }, async (signal) => {
  const { child, ended } = session()
  const service = await runningService()
  child.kill(signal)
  expect(await ended).toBe(0)
  expect(isAlive(service)).toBe(false)
  expect(existsSync(lockFile())).toBe(false)
})

it('refuses to start twice, and says who runs where', { timeout: SLOW }, async () => {
  const first = session()
  const service = await runningService()
  const second = session()
  expect(await second.ended).toBe(1)
  expect(second.said()).toContain(`Hoopwright (npm start) already runs here at http://127.0.0.1:3000: process ${first.child.pid}`)
  expect(second.said()).toContain(`kill ${first.child.pid}`)
  expect(isAlive(service)).toBe(true)
  first.child.kill('SIGTERM')
  await first.ended
})

it('starts again after it was killed outright, and says so', { timeout: SLOW }, async () => {
  const first = session()
  const service = await runningService()
  first.child.kill('SIGKILL')
  await first.ended
  await vi.waitFor(() => expect(isAlive(service)).toBe(false), { timeout: SLOW, interval: 20 })
  const second = session('return 0')
  expect(await second.ended).toBe(0)
  expect(second.said()).toContain('An earlier run here ended without cleaning up')
})

it('tells a failure in one sentence with what to do, and stops what it had started', { timeout: SLOW }, async () => {
  const { ended, said } = session("throw new Failure('The port is taken.', { todo: 'Set PORT.' })")
  expect(await ended).toBe(1)
  expect(said()).toBe('\nThe port is taken.\nSet PORT.\n')
  expect(existsSync(lockFile())).toBe(false)
})

it('stops everything when npm, which started it, is killed outright', { timeout: SLOW }, async () => {
  const { child } = session(STAYS, { throughNpm: true })
  const service = await runningService()
  child.kill('SIGKILL')
  await vi.waitFor(() => expect(isAlive(service)).toBe(false), { timeout: SLOW, interval: 20 })
  await vi.waitFor(() => expect(existsSync(lockFile())).toBe(false), { timeout: SLOW, interval: 20 })
})
