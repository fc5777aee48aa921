import { existsSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { parseEnv } from 'node:util'
import { Failure } from './failure.mjs'

const ENV_FILES = ['.env.local', '.env']
/** The mail service calls this route of the app about each mail's fate. */
const MAIL_WEBHOOK_PATH = '/api/webhooks/mail'
const OWN_SERVICES = /^(DATABASE_URL|APP_URL|PORT|NEXTAUTH_|LINK_SECRET|RESEND_|MAIL_FROM|MAILBOX_URL|BLOB_DIR|S3_|HOOPWRIGHT_)/

/** The settings in .env.local and .env; what the shell sets comes before them. */
export function readEnvFiles(projectRoot, env = process.env) {
  const settings = {}
  for (const name of ENV_FILES) {
    const file = join(projectRoot, name)
    if (!existsSync(file)) continue
    for (const [key, value] of Object.entries(parseEnv(readFileSync(file, 'utf8')))) settings[key] ??= value
  }
  return { ...settings, ...env }
}

/** The environment of a test run: nothing that could lead it to somebody's real database, mail service or files. */
export function withoutOwnServices(env = process.env) {
  const kept = Object.entries(env).filter(([name]) => !OWN_SERVICES.test(name))
  return Object.fromEntries(kept)
}

/** Which services are the reader's own, by what is set. */
export function ownServices(env) {
  return { database: Boolean(env['DATABASE_URL']), mail: Boolean(env['RESEND_API_KEY']), files: Boolean(env['S3_BUCKET']) }
}

export function mailWebhookUrl(appUrl) {
  return new URL(MAIL_WEBHOOK_PATH, appUrl).href
}

/**
 * What the app and the worker need to know, made of what the reader set and of what runs here.
 * @param {{ env: object, secrets: object, databaseUrl: string, appUrl: string, mailboxUrl?: string, blobDir: string }} parts
 *   `mailboxUrl`: of the local mailbox, when no real mail service is set
 */
export function appEnv({ env, secrets, databaseUrl, appUrl, mailboxUrl, blobDir }) {
  const own = ownServices(env)
  if (own.mail && !env['MAIL_FROM']) {
    throw new Failure('RESEND_API_KEY is set, but MAIL_FROM is not.', {
      todo: 'Set MAIL_FROM to the address that mail goes out from, such as "Packs <packs@your-domain>".',
    })
  }
  if (own.mail && !env['RESEND_WEBHOOK_SECRET']) {
    throw new Failure('RESEND_API_KEY is set, but RESEND_WEBHOOK_SECRET is not.', {
      todo: `Add a webhook at the mail service for ${mailWebhookUrl(appUrl)} and set RESEND_WEBHOOK_SECRET to its signing secret.`,
    })
  }
  const mail = own.mail
    ? {}
    : {
        RESEND_API_KEY: secrets.mailKey,
        RESEND_BASE_URL: mailboxUrl,
        RESEND_WEBHOOK_SECRET: secrets.mailWebhookSecret,
        MAILBOX_URL: mailboxUrl,
      }
  return {
    NEXTAUTH_SECRET: env['NEXTAUTH_SECRET'] || secrets.nextauthSecret,
    LINK_SECRET: env['LINK_SECRET'] || secrets.linkSecret,
    NEXTAUTH_URL: env['NEXTAUTH_URL'] || appUrl,
    DATABASE_URL: databaseUrl,
    APP_URL: appUrl,
    ...(own.files ? {} : { BLOB_DIR: env['BLOB_DIR'] || blobDir }),
    ...mail,
    NEXT_TELEMETRY_DISABLED: '1',
  }
}

/** Settings of a test run that keep Next from taking a developer's own out of .env. */
export function blankedSettings(projectRoot, set) {
  const names = ENV_FILES.concat('.env.production', '.env.production.local')
    .map((name) => join(projectRoot, name))
    .filter((file) => existsSync(file))
    .flatMap((file) => Object.keys(parseEnv(readFileSync(file, 'utf8'))))
  return Object.fromEntries(names.filter((name) => OWN_SERVICES.test(name) && !(name in set)).map((name) => [name, '']))
}
