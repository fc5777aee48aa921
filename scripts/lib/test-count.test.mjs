import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { countPlaywright, countVitest } from './test-count.mjs'

let folder
let file

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'count-'))
  file = join(folder, 'report.json')
})
afterEach(() => rmSync(folder, { recursive: true, force: true }))

const put = (report) => writeFileSync(file, JSON.stringify(report))
const vitest = { numPassedTests: 7, numFailedTests: 0, numPendingTests: 0, numTodoTests: 0, testResults: [] }
const playwright = { stats: { expected: 3, unexpected: 0, flaky: 0, skipped: 0 }, errors: [] }

describe('Vitest', () => {
  it('counts what passed and what failed', () => {
    put({ ...vitest, numFailedTests: 2 })
    expect(countVitest(file, false)).toMatchObject({ passed: 7, failed: 2 })
  })

  it('counts a skipped test and a file that does not load as failed', () => {
    put({ ...vitest, numPendingTests: 1, testResults: [{ name: 'a.test.ts', status: 'failed', assertionResults: [] }] })
    expect(countVitest(file, false)).toMatchObject({ passed: 7, failed: 2 })
  })

  it('counts a runner that fails without blaming a test, and one that wrote nothing, as a failure', () => {
    expect(countVitest(file, true)).toMatchObject({ passed: 0, failed: 1 })
    put(vitest)
    expect(countVitest(file, true)).toMatchObject({ passed: 7, failed: 0 })
    expect(countVitest(file, false)).toMatchObject({ passed: 7, failed: 1 })
  })
})

describe('Playwright', () => {
  it('counts what passed', () => {
    put(playwright)
    expect(countPlaywright(file, true)).toMatchObject({ passed: 3, failed: 0 })
  })

  it('counts flaky and skipped tests and errors outside tests as failed', () => {
    put({ stats: { expected: 3, unexpected: 1, flaky: 1, skipped: 1 }, errors: [{ message: 'no browser' }] })
    expect(countPlaywright(file, false)).toMatchObject({ passed: 3, failed: 4 })
  })
})
