import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, expect, it } from 'vitest'
import { buildSettings, builtFiles, sourcesHash } from './build.mjs'
import { placeOf } from './place.mjs'

let folder

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'build-'))
  mkdirSync(join(folder, 'app', 'r'), { recursive: true })
  mkdirSync(join(folder, 'tests'))
  writeFileSync(join(folder, 'app', 'r', 'page.tsx'), 'one')
  writeFileSync(join(folder, 'app', 'page.test.tsx'), 'test')
  writeFileSync(join(folder, 'tests', 'a.ts'), 'test')
  writeFileSync(join(folder, 'next.config.ts'), 'config')
  writeFileSync(join(folder, 'README.md'), 'words')
})

afterEach(() => rmSync(folder, { recursive: true, force: true }))

it('takes sources and settings, and leaves out tests and words', () => {
  expect(builtFiles(folder)).toEqual(['app/r/page.tsx', 'next.config.ts'])
})

it('changes when a source changes, moves or comes, and with what is compiled in', () => {
  const hashes = [sourcesHash(folder, {})]
  hashes.push(sourcesHash(folder, { NEXT_PUBLIC_NAME: 'x' }))
  writeFileSync(join(folder, 'app', 'r', 'page.tsx'), 'two')
  hashes.push(sourcesHash(folder, {}))
  writeFileSync(join(folder, 'app', 'layout.tsx'), '')
  hashes.push(sourcesHash(folder, {}))
  expect(new Set(hashes).size).toBe(hashes.length)
})

it('stays the same when only a test or an unrelated setting changes', () => {
  const before = sourcesHash(folder, {})
  writeFileSync(join(folder, 'app', 'page.test.tsx'), 'changed')
  expect(sourcesHash(folder, { PORT: '3001' })).toBe(before)
})

it('gives a test build a folder and a tsconfig of its own, and leaves the project’s alone', () => {
  expect(buildSettings(placeOf('start', folder))).toEqual({ NEXT_DIST_DIR: '.next' })
  expect(buildSettings(placeOf('test', folder))).toEqual({ NEXT_DIST_DIR: '.next-test', NEXT_TSCONFIG: '.local/test/tsconfig.json' })
})
