import { mkdtempSync, rmSync, statSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, expect, it } from 'vitest'
import { keepSecrets } from './secrets.mjs'

let folder
let file

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'secrets-'))
  file = join(folder, 'secrets.json')
})

afterEach(() => rmSync(folder, { recursive: true, force: true }))

it('makes secrets once, for their owner alone, and keeps them', () => {
  const { secrets, made } = keepSecrets(file)
  expect(made).toBeGreaterThan(0)
  expect(statSync(file).mode & 0o777).toBe(0o600)
  expect(keepSecrets(file)).toEqual({ secrets, made: 0 })
})

it('makes secrets long enough for what they guard', () => {
  const { secrets } = keepSecrets(file)
  expect(secrets.nextauthSecret.length).toBeGreaterThanOrEqual(32)
  expect(secrets.linkSecret.length).toBeGreaterThanOrEqual(32)
  expect(Buffer.from(secrets.mailWebhookSecret.replace('whsec_', ''), 'base64')).toHaveLength(24)
})

it('adds a secret that an older release did not know, and keeps the others', () => {
  writeFileSync(file, JSON.stringify({ linkSecret: 'kept' }))
  expect(keepSecrets(file).secrets.linkSecret).toBe('kept')
})

it('refuses a broken file rather than making new secrets over it', () => {
  writeFileSync(file, '{"linkSecret": "ha')
  expect(() => keepSecrets(file)).toThrow('cannot be read')
})
