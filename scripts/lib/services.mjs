import { join } from 'node:path'
import { setTimeout as delay } from 'node:timers/promises'
import { Failure } from './failure.mjs'
import { mailWebhookUrl } from './app-env.mjs'
import { buildSettings } from './build.mjs'
import { typescriptCommand } from './typescript.mjs'

const HEALTHY_WITHIN_MS = 120_000
const ANSWER_WITHIN_MS = 5_000
/** A worker that dies is started again after 1, 2, 4 … seconds; after this many deaths without a calm spell between, we give up. */
const WORKER_DEATHS = 5
const CALM_MS = 60_000
const LONGEST_PAUSE_MS = 30_000

/** Waits until an address answers 200, or the service behind it dies. */
export async function untilHealthy(url, service) {
  const until = Date.now() + HEALTHY_WITHIN_MS
  let last = 'no answer'
  while (Date.now() < until) {
    if (service.over) throw new Failure(`The ${service.name} ${await service.ended} before it was ready.`, { log: service.log })
    try {
      const response = await fetch(url, { signal: AbortSignal.timeout(ANSWER_WITHIN_MS) })
      const text = await response.text()
      if (response.status === 200) return
      last = `${response.status} ${text.slice(0, 300)}`
    } catch (error) {
      last = error.cause?.message ?? error.message
    }
    await Promise.race([delay(150), service.ended])
  }
  throw new Failure(`The ${service.name} did not become ready at ${url} within ${HEALTHY_WITHIN_MS / 1000} s: ${last}`, { log: service.log })
}

/** The local stand-in for the mail service, with its mailbox page. */
export async function startMailbox({ processes, place, secrets, port, appUrl }) {
  const [command, args] = typescriptCommand('scripts/mail-fake/server.ts')
  const service = processes.start('mailbox', command, args, {
    env: {
      MAIL_FAKE_PORT: String(port),
      MAIL_FAKE_FOLDER: place.mail,
      MAIL_FAKE_KEY: secrets.mailKey,
      MAIL_FAKE_WEBHOOK_URL: mailWebhookUrl(appUrl),
      MAIL_FAKE_WEBHOOK_SECRET: secrets.mailWebhookSecret,
    },
  })
  await untilHealthy(`http://127.0.0.1:${port}/health`, service)
  return service
}

export async function startApp({ processes, place, env, port, dev = false }) {
  const next = join('node_modules', 'next', 'dist', 'bin', 'next')
  const service = processes.start('app', process.execPath, [next, dev ? 'dev' : 'start', '-H', '127.0.0.1', '-p', String(port)], {
    env: { ...env, ...buildSettings(place), NODE_ENV: dev ? 'development' : 'production' },
    show: dev,
  })
  await untilHealthy(`http://127.0.0.1:${port}/api/health`, service)
  return service
}

/**
 * Starts the worker and starts it again when it dies.
 * @returns {{ ended: Promise<string>, name: string, log: string }} `ended` settles when it has died too often
 */
export function keepWorker({ processes, env, dev = false, tell }) {
  const [command, args] = typescriptCommand('lib/server/jobs/worker.ts')
  const begin = (append) =>
    processes.start('worker', command, args, { env: { ...env, NODE_ENV: dev ? 'development' : 'production' }, append })
  const first = begin(false)
  const watch = async () => {
    let service = first
    let deaths = 0
    for (;;) {
      const from = Date.now()
      const how = await service.ended
      deaths = Date.now() - from > CALM_MS ? 1 : deaths + 1
      if (processes.closed || deaths > WORKER_DEATHS) return how
      const pauseMs = Math.min(2 ** (deaths - 1) * 1000, LONGEST_PAUSE_MS)
      tell(`The worker ${how}; it is started again in ${pauseMs / 1000} s (see its log)`)
      await delay(pauseMs)
      if (processes.closed) return how
      service = begin(true)
    }
  }
  return { name: 'worker', log: first.log, ended: watch() }
}
