import { mkdirSync } from 'node:fs'
import { appEnv, ownServices, readEnvFiles } from './lib/app-env.mjs'
import { backUp, emptyDatabase, restore } from './lib/database-archive.mjs'
import { migrateDatabase, seedDemo } from './lib/database-content.mjs'
import { Failure } from './lib/failure.mjs'
import { holderOf } from './lib/lock.mjs'
import { fromRoot, placeOf, root } from './lib/place.mjs'
import { Processes } from './lib/processes.mjs'
import { databaseUrl as localUrl, runningServer } from './lib/postgres-cluster.mjs'
import { clusterHome } from './lib/postgres-home.mjs'
import { foundPrograms } from './lib/postgres-programs.mjs'
import { prepareCluster, preparePackages, preparePostgres, prepareSecrets } from './lib/prepare.mjs'
import { runSession, tellFailure } from './lib/session.mjs'
import { createSteps } from './lib/steps.mjs'

// npm run db:migrate | db:seed | db:reset | db:backup | db:restore -- NAME
// On the database that DATABASE_URL names, else on the local one: the one that npm start has running, or one started for as long as this takes.

const DESTROYS = new Set(['reset', 'restore'])
const TOOLS_NEEDED = new Set(['reset', 'backup', 'restore'])

const [action = '', ...rest] = process.argv.slice(2)
const agreed = rest.includes('--yes')
const name = rest.find((arg) => !arg.startsWith('--'))
const env = readEnvFiles(root)
const own = ownServices(env)
const place = placeOf('start')

const ACTIONS = {
  migrate: ({ steps, processes, settings }) => steps.step('Tables', (say) => migrateDatabase({ processes, env: settings, say })),
  async seed(run) {
    await ACTIONS.migrate(run)
    await run.steps.step('Demo', (say) => seedDemo({ processes: run.processes, env: run.settings, say }))
  },
  async reset(run) {
    await run.steps.step('Emptying', () => emptyDatabase(run))
    await ACTIONS.seed(run)
  },
  backup: (run) =>
    run.steps.step('Backup', async (say) => {
      const { folder, withFiles } = await backUp(run)
      say(`${fromRoot(folder)}${withFiles ? ', with the stored files' : '; the files in the hosted store are not in it'}`)
    }),
  async restore(run) {
    await run.steps.step('Restore', async (say) => {
      await restore({ ...run, name })
      say(`${name} is back`)
    })
    await ACTIONS.migrate(run)
  },
}

function check() {
  if (!(action in ACTIONS)) {
    throw new Failure(`"${action}" is nothing to do with the database.`, { todo: `Say one of: ${Object.keys(ACTIONS).join(', ')}.` })
  }
  if (own.database && DESTROYS.has(action) && !agreed) {
    throw new Failure(`This would delete everything in the database that DATABASE_URL names; nothing was changed.`, {
      todo: `If that is what you want:  npm run db:${action} -- ${[name, '--yes'].filter(Boolean).join(' ')}`,
    })
  }
}

/** The work on a database that is reachable. */
async function act({ steps, processes, url, secrets, programs }) {
  mkdirSync(place.blobs, { recursive: true })
  const settings = appEnv({
    env,
    secrets,
    databaseUrl: url,
    appUrl: env['APP_URL'] || holderOf(place.lockFile)?.address || 'http://127.0.0.1:3000',
    mailboxUrl: holderOf(place.lockFile)?.mailboxUrl,
    blobDir: place.blobs,
  })
  const tools = programs ?? (TOOLS_NEEDED.has(action) ? toolsHere() : null)
  await ACTIONS[action]({ place, steps, processes, settings, url, programs: tools, blobDir: settings.BLOB_DIR })
}

function toolsHere() {
  const [found] = foundPrograms()
  if (found) return found
  throw new Failure("PostgreSQL's programs are not on this machine.", { todo: 'Install them (apt-get install postgresql-client) so that psql, pg_dump and pg_restore are there.' })
}

/** On a database that runs already: nothing to start and nothing to lock. */
async function onRunning(url, secrets) {
  const processes = new Processes({ place: { ...place, processesFile: `${place.processesFile}.database` }, env })
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => void processes.stopAll().then(() => process.exit(130)))
  try {
    await act({ steps: createSteps(), processes, url, secrets })
  } finally {
    await processes.stopAll()
  }
}

try {
  check()
  const running = own.database ? null : runningServer(clusterHome(place))
  const holder = holderOf(place.lockFile)
  if (own.database) {
    await onRunning(env['DATABASE_URL'], await prepareSecrets({ steps: createSteps(), place }))
  } else if (running && holder?.running) {
    if (DESTROYS.has(action)) {
      throw new Failure(`Hoopwright runs here (process ${holder.pid}) and works on the database that this would replace; nothing was changed.`, {
        todo: 'Stop it first with Ctrl-C in its terminal, then run this again.',
      })
    }
    const secrets = await prepareSecrets({ steps: createSteps(), place })
    await onRunning(localUrl({ port: running.port, password: secrets.databasePassword }), secrets)
  } else {
    await runSession({ place, what: `npm run db:${action}`, env }, async (run) => {
      await preparePackages(run)
      const secrets = await prepareSecrets(run)
      const { url, programs } = await prepareCluster(run, { programs: await preparePostgres(run), secrets })
      await act({ ...run, url, secrets, programs })
    })
  }
} catch (error) {
  tellFailure(error)
  process.exit(1)
}
