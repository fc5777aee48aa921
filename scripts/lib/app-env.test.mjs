import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { appEnv, blankedSettings, readEnvFiles, withoutOwnServices } from './app-env.mjs'

let folder

beforeEach(() => (folder = mkdtempSync(join(tmpdir(), 'env-'))))
afterEach(() => rmSync(folder, { recursive: true, force: true }))

const secrets = { nextauthSecret: 'n', linkSecret: 'l', mailKey: 're_local_k', mailWebhookSecret: 'whsec_s' }
const local = { secrets, databaseUrl: 'postgres://here', appUrl: 'http://127.0.0.1:3000', mailboxUrl: 'http://127.0.0.1:8025', blobDir: '/blobs' }

describe('the app’s environment', () => {
  it('points everything at this machine when nothing is set', () => {
    expect(appEnv({ env: {}, ...local })).toMatchObject({
      DATABASE_URL: 'postgres://here',
      RESEND_BASE_URL: 'http://127.0.0.1:8025',
      RESEND_API_KEY: 're_local_k',
      BLOB_DIR: '/blobs',
      NEXTAUTH_URL: 'http://127.0.0.1:3000',
    })
  })

  it('leaves a real mail service and a real store as they are set', () => {
    const env = { RESEND_API_KEY: 're_real', RESEND_WEBHOOK_SECRET: 'whsec_real', MAIL_FROM: 'a@b.example', S3_BUCKET: 'packs' }
    const made = appEnv({ env, ...local, mailboxUrl: undefined })
    for (const name of ['RESEND_API_KEY', 'RESEND_BASE_URL', 'RESEND_WEBHOOK_SECRET', 'MAILBOX_URL', 'BLOB_DIR']) expect(made).not.toHaveProperty(name)
  })

  it('keeps secrets that are set before those made here', () => {
    expect(appEnv({ env: { NEXTAUTH_SECRET: 'mine' }, ...local }).NEXTAUTH_SECRET).toBe('mine')
  })

  it('refuses a real mail service without a sender or without the webhook’s secret', () => {
    expect(() => appEnv({ env: { RESEND_API_KEY: 're_real' }, ...local })).toThrow('MAIL_FROM is not')
    expect(() => appEnv({ env: { RESEND_API_KEY: 're_real', MAIL_FROM: 'a@b.example' }, ...local })).toThrow('RESEND_WEBHOOK_SECRET is not')
  })
})

describe('settings in files', () => {
  it('gives way to the shell, and .env to .env.local', () => {
    writeFileSync(join(folder, '.env'), 'A=env\nB=env\nC=env\n')
    writeFileSync(join(folder, '.env.local'), 'A=local\nB=local\n')
    expect(readEnvFiles(folder, { A: 'shell' })).toEqual({ A: 'shell', B: 'local', C: 'env' })
  })

  it('keeps a test run from everything that is real', () => {
    const env = { PATH: '/bin', DATABASE_URL: 'postgres://real', RESEND_API_KEY: 're_real', S3_BUCKET: 'real', NEXTAUTH_SECRET: 'real' }
    expect(withoutOwnServices(env)).toEqual({ PATH: '/bin' })
    writeFileSync(join(folder, '.env'), 'S3_BUCKET=real\nDATABASE_URL=postgres://real\nCOLOUR=red\n')
    expect(blankedSettings(folder, { DATABASE_URL: 'postgres://test' })).toEqual({ S3_BUCKET: '' })
  })
})
