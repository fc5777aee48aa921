import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, expect, it, vi } from 'vitest'
import { Failure } from './failure.mjs'
import { createSteps } from './steps.mjs'
import { Tally } from './tally.mjs'

let printed
let folder
const run = { steps: createSteps({ write: () => {} }), processes: { closed: false } }

beforeEach(() => {
  printed = ''
  folder = mkdtempSync(join(tmpdir(), 'tally-'))
  vi.spyOn(process.stdout, 'write').mockImplementation((text) => {
    printed += text
    return true
  })
})
afterEach(() => {
  vi.restoreAllMocks()
  rmSync(folder, { recursive: true, force: true })
})

it('adds each check as one and each test of a suite, and ends with one line', async () => {
  const log = join(folder, 'unit.log')
  writeFileSync(log, 'the bass drum is square')
  const tally = new Tally()
  await tally.check(run, 'Lint', () => {})
  const failed = await tally.check(run, 'Types', () => {
    throw new Failure('Types do not fit.')
  })
  await tally.suite(run, 'Unit tests', () => ({ passed: 40, failed: 2, notes: ['1 tests are skipped'], log }))
  tally.print()
  expect(failed).toBeNull()
  expect(printed).toContain('Types do not fit.')
  expect(printed).toContain('the bass drum is square')
  expect(printed).toContain('1 tests are skipped')
  expect(printed.endsWith('\n41 passed, 3 failed\n')).toBe(true)
})

it('gives no verdict on a check that was stopped half-way', async () => {
  const tally = new Tally()
  const stopped = tally.check({ ...run, processes: { closed: true } }, 'Build', () => {
    throw new Failure('Stopped.')
  })
  await expect(stopped).rejects.toThrow('Stopped.')
  expect(tally).toMatchObject({ passed: 0, failed: 0 })
})
