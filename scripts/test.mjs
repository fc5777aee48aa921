import { mkdirSync, rmSync } from 'node:fs'
import { join } from 'node:path'
import { appEnv, blankedSettings, withoutOwnServices } from './lib/app-env.mjs'
import { buildApp } from './lib/build.mjs'
import { findChromium } from './lib/chromium.mjs'
import { migrateDatabase, seedDemo } from './lib/database-content.mjs'
import { checkMigrationsDrift } from './lib/migrations-drift.mjs'
import { npmCommand } from './lib/npm.mjs'
import { placeOf, root } from './lib/place.mjs'
import { anyFreePort } from './lib/ports.mjs'
import { clearLeftoverServer } from './lib/postgres-cluster.mjs'
import { clusterHome } from './lib/postgres-home.mjs'
import { prepareCluster, preparePackages, preparePostgres, prepareSecrets } from './lib/prepare.mjs'
import { runSession } from './lib/session.mjs'
import { keepWorker, startApp, startMailbox } from './lib/services.mjs'
import { countPlaywright, countVitest } from './lib/test-count.mjs'
import { Tally } from './lib/tally.mjs'

const SUITES = ['unit', 'integration', 'e2e']
const VITEST = join('node_modules', 'vitest', 'vitest.mjs')
const PLAYWRIGHT = join('node_modules', '@playwright', 'test', 'cli.js')

const asked = process.argv.slice(2).filter((arg) => SUITES.includes(arg))
const forRunner = process.argv.slice(2).filter((arg) => !SUITES.includes(arg) && arg !== '--')
const wanted = new Set(asked.length > 0 ? asked : SUITES)
const everything = asked.length === 0
const overHttp = wanted.has('integration') || wanted.has('e2e')

const place = placeOf('test')

/** A run begins with nothing of the one before, but for the build, which is made anew only when the sources changed. */
async function beginAfresh() {
  const home = clusterHome(place)
  await clearLeftoverServer(home)
  rmSync(home.folder, { recursive: true, force: true })
  rmSync(place.local, { recursive: true, force: true })
  placeOf('test')
}

async function npmScript({ processes }, name) {
  const [command, args] = npmCommand(['run', '--silent', name])
  await processes.run(name, command, args, { failure: `npm run ${name} finds faults.` })
}

async function vitest({ processes }, project, env = {}) {
  const report = join(place.local, `${project}.json`)
  const args = [VITEST, 'run', '--project', project, '--reporter=default', '--reporter=json', `--outputFile.json=${report}`, ...forRunner]
  const { ok, log } = await processes.run(project, process.execPath, args, { env, allowFailure: true })
  return { ...countVitest(report, ok), log }
}

async function playwright({ processes }, env) {
  const report = join(place.local, 'e2e.json')
  const args = [PLAYWRIGHT, 'test', '--reporter=list,json', ...forRunner]
  const { ok, log } = await processes.run('e2e', process.execPath, args, {
    env: { ...env, PLAYWRIGHT_JSON_OUTPUT_FILE: report, PLAYWRIGHT_JSON_OUTPUT_NAME: report },
    allowFailure: true,
  })
  return { ...countPlaywright(report, ok), log }
}

/** A whole Hoopwright of the test's own: database, mailbox, worker and app on free ports. Returns what the tests need to reach it. */
async function startEverything(run, { programs, secrets }) {
  const { steps, processes, tell } = run
  const { url: databaseUrl } = await prepareCluster(run, { programs, secrets, throwaway: true })
  const port = await anyFreePort()
  const mailboxPort = await anyFreePort()
  const appUrl = `http://127.0.0.1:${port}`
  const mailboxUrl = `http://127.0.0.1:${mailboxPort}`
  mkdirSync(place.blobs, { recursive: true })
  const known = appEnv({ env: {}, secrets, databaseUrl, appUrl, mailboxUrl, blobDir: place.blobs })
  const settings = { ...blankedSettings(root, known), ...known }
  await steps.step('Tables', (say) => migrateDatabase({ processes, env: settings, say }))
  await steps.step('Demo', (say) => seedDemo({ processes, env: settings, say }))
  await steps.step('App, worker and mailbox', async (say) => {
    await startMailbox({ processes, place, secrets, port: mailboxPort, appUrl })
    keepWorker({ processes, env: settings, tell })
    await startApp({ processes, place, env: settings, port })
    say(`ready at ${appUrl}`)
  })
  return { ...settings, BASE_URL: appUrl }
}

const tally = new Tally()
await runSession(
  { place, what: 'npm test', env: withoutOwnServices() },
  async (run) => {
    const { steps, processes } = run
    await preparePackages(run)
    const programs = await preparePostgres(run)
    await beginAfresh()
    const chromium = wanted.has('e2e') ? await steps.step('Chromium', (say) => findChromium({ place, processes, say })) : null
    const secrets = await prepareSecrets(run)

    if (everything) {
      await tally.check(run, 'Lint', () => npmScript(run, 'lint'))
      await tally.check(run, 'Types', () => npmScript(run, 'typecheck'))
      await tally.check(run, 'Layers', () => npmScript(run, 'layers'))
      await tally.check(run, 'Migrations against schema', (say) => checkMigrationsDrift({ place, processes, say }))
    }
    if (wanted.has('unit')) await tally.suite(run, 'Unit tests', () => vitest(run, 'unit'))
    if (overHttp) {
      const env = await tally.check(run, 'Build', async (say) => {
        await buildApp({ place, processes, env: {}, say })
        return true
      })
      const reach = env && (await tally.check(run, 'A Hoopwright to test', () => startEverything(run, { programs, secrets })))
      if (!reach) tally.miss('The integration and browser tests had nothing to run against.')
      else {
        if (wanted.has('integration')) await tally.suite(run, 'Integration tests', () => vitest(run, 'integration', reach))
        if (wanted.has('e2e')) await tally.suite(run, 'Browser tests', () => playwright(run, { ...reach, CHROMIUM_PATH: chromium }))
      }
    }
    await steps.step('Stopping', () => processes.stopAll())
    tally.print()
    return tally.failed > 0 ? 1 : 0
  },
  (failure) => {
    tally.miss(failure)
    tally.print()
  },
)
