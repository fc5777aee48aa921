import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, expect, it } from 'vitest'
import { missingPackages } from './packages.mjs'

let folder

const put = (path, value) => writeFileSync(join(folder, path), JSON.stringify(value))

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'packages-'))
  put('package.json', { dependencies: { drum: '1.0.0' }, devDependencies: { stick: '2.0.0' } })
  put('package-lock.json', {
    packages: {
      '': {},
      'node_modules/drum': { version: '1.0.0' },
      'node_modules/stick': { version: '2.0.0', dev: true },
      'node_modules/drum/node_modules/@shell/maple': { version: '3.0.0' },
      'node_modules/other-system': { version: '1.0.0', optional: true },
    },
  })
  mkdirSync(join(folder, 'node_modules', 'drum', 'node_modules', '@shell', 'maple'), { recursive: true })
  mkdirSync(join(folder, 'node_modules', 'stick'))
})

afterEach(() => rmSync(folder, { recursive: true, force: true }))

const installed = {
  'node_modules/drum': { version: '1.0.0' },
  'node_modules/stick': { version: '2.0.0' },
  'node_modules/drum/node_modules/@shell/maple': { version: '3.0.0' },
}
const putInstalled = (packages) => put('node_modules/.package-lock.json', { packages })

it('finds nothing amiss when all is as locked, packages for other systems apart', () => {
  putInstalled(installed)
  expect(missingPackages(folder)).toEqual([])
})

it('counts an installation that broke off as none', () => {
  expect(missingPackages(folder)).toEqual(['all of them'])
})

it('names a package of another version, however deep', () => {
  putInstalled({ ...installed, 'node_modules/drum/node_modules/@shell/maple': { version: '2.9.0' } })
  expect(missingPackages(folder)).toEqual(['@shell/maple'])
})

it('names a package that the project asks for and npm never installed', () => {
  const { 'node_modules/stick': _, ...rest } = installed
  putInstalled(rest)
  expect(missingPackages(folder)).toEqual(['stick'])
})

it('names a package whose folder is gone', () => {
  putInstalled(installed)
  rmSync(join(folder, 'node_modules', 'stick'), { recursive: true })
  expect(missingPackages(folder)).toEqual(['stick'])
})
