import { chmodSync, existsSync, readFileSync, renameSync, writeFileSync } from 'node:fs'
import { randomBytes } from 'node:crypto'
import { Failure } from './failure.mjs'
import { fromRoot } from './place.mjs'

const MAKERS = {
  databasePassword: () => randomBytes(24).toString('hex'),
  nextauthSecret: () => randomBytes(32).toString('base64url'),
  linkSecret: () => randomBytes(32).toString('base64url'),
  mailKey: () => `re_local_${randomBytes(16).toString('hex')}`,
  mailWebhookSecret: () => `whsec_${randomBytes(24).toString('base64')}`,
}

/** The secrets of this working copy: each made once, kept in a file only its owner can read. */
export function keepSecrets(file) {
  let kept = {}
  if (existsSync(file)) {
    try {
      kept = JSON.parse(readFileSync(file, 'utf8'))
    } catch (cause) {
      throw new Failure(`The secrets in ${fromRoot(file)} cannot be read.`, {
        todo: 'Put the file back from a copy, or delete it: everybody signed in here is then signed out and mailed links stop working.',
        cause,
      })
    }
  }
  const missing = Object.keys(MAKERS).filter((name) => typeof kept[name] !== 'string')
  const secrets = { ...kept, ...Object.fromEntries(missing.map((name) => [name, MAKERS[name]()])) }
  if (missing.length > 0) {
    writeFileSync(`${file}.new`, `${JSON.stringify(secrets, null, 2)}\n`, { mode: 0o600 })
    renameSync(`${file}.new`, file)
  }
  chmodSync(file, 0o600)
  return { secrets, made: missing.length }
}
