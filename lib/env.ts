import { z } from 'zod'

const optional = z.string().min(1).optional()

const schema = z.object({
  NODE_ENV: z.enum(['development', 'production', 'test']).default('development'),
  DATABASE_URL: z.string().min(1, 'the address of the PostgreSQL database'),
  /** Where people reach the app; links in mails begin with it. */
  APP_URL: z.url('the public address of the app, such as https://hoopwright.example'),
  NEXTAUTH_SECRET: z.string().min(32, 'at least 32 characters of random text'),
  /** Key that link tokens are made from; changing it ends every link. */
  LINK_SECRET: z.string().min(32, 'at least 32 characters of random text'),
  RESEND_API_KEY: z.string().min(1, 'the key of the mail service'),
  RESEND_BASE_URL: optional,
  RESEND_WEBHOOK_SECRET: z.string().startsWith('whsec_', 'the signing secret of the mail webhook, beginning with whsec_'),
  MAIL_FROM: z.string().min(3).default('Hoopwright <packs@hoopwright.example>'),
  /** Shown on the sign-in page of a local set-up only. */
  MAILBOX_URL: optional,
  BLOB_DIR: optional,
  S3_ENDPOINT: optional,
  S3_BUCKET: optional,
  S3_REGION: z.string().default('auto'),
  S3_ACCESS_KEY_ID: optional,
  S3_SECRET_ACCESS_KEY: optional,
  /** How many proxies in front of the app append to X-Forwarded-For. */
  TRUSTED_PROXIES: z.coerce.number().int().min(0).max(5).default(1),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).default('info'),
})

export type Env = z.infer<typeof schema>

let parsed: Env | undefined

/** The environment, checked once at first use. Throws one sentence that names every variable at fault. */
export function env(): Env {
  if (parsed) return parsed
  // A line left empty in an environment file means "not set".
  const given = Object.fromEntries(Object.entries(process.env).filter(([, value]) => value !== ''))
  const result = schema.safeParse(given)
  if (!result.success) {
    const faults = result.error.issues.map((issue) => `${issue.path.join('.')} (${issue.message})`).join(', ')
    throw new Error(`The environment is not complete: ${faults}. See .env.example.`)
  }
  if (!result.data.BLOB_DIR && !result.data.S3_BUCKET) {
    throw new Error('The environment is not complete: set BLOB_DIR for a local store or S3_BUCKET for a hosted one. See .env.example.')
  }
  parsed = result.data
  return parsed
}
