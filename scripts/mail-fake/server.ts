import { createMailFake } from './create-mail-fake'

/** A mail is said to have arrived soon after the app has noted that it was accepted. */
const DELAY_MS = 500
const RETRY_DELAYS_MS = [1_000, 5_000, 15_000, 60_000, 300_000]

function setting(name: string): string {
  const value = process.env[name]
  if (!value) {
    process.stderr.write(`${name} is not set; the local mailbox is started by npm start.\n`)
    process.exit(1)
  }
  return value
}

const fake = createMailFake({
  folder: setting('MAIL_FAKE_FOLDER'),
  apiKey: setting('MAIL_FAKE_KEY'),
  webhook: {
    url: setting('MAIL_FAKE_WEBHOOK_URL'),
    secret: setting('MAIL_FAKE_WEBHOOK_SECRET'),
    delayMs: DELAY_MS,
    retryDelaysMs: RETRY_DELAYS_MS,
  },
})
fake.server.on('error', (error) => {
  process.stderr.write(`The mailbox cannot listen: ${error.message}\n`)
  process.exit(1)
})
fake.server.listen(Number(setting('MAIL_FAKE_PORT')), '127.0.0.1')

for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) {
  process.on(signal, () => void fake.close().then(() => process.exit(0)))
}
