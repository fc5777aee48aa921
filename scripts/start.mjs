import { existsSync, mkdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { appEnv, ownServices, readEnvFiles } from './lib/app-env.mjs'
import { buildApp } from './lib/build.mjs'
import { migrateDatabase, seedDemo } from './lib/database-content.mjs'
import { Failure } from './lib/failure.mjs'
import { fromRoot, placeOf, root } from './lib/place.mjs'
import { appPort, nextFreePort } from './lib/ports.mjs'
import { prepareCluster, preparePackages, preparePostgres, prepareSecrets } from './lib/prepare.mjs'
import { runSession } from './lib/session.mjs'
import { keepWorker, startApp, startMailbox } from './lib/services.mjs'

const USUAL_PORT = 3000
const USUAL_MAILBOX_PORT = 8025
const OLDEST_NODE = [20, 20]

const dev = process.argv.includes('--dev')

function checkNode() {
  const [major, minor] = process.versions.node.split('.').map(Number)
  const [oldestMajor, oldestMinor] = OLDEST_NODE
  if (major > oldestMajor || (major === oldestMajor && minor >= oldestMinor)) return
  throw new Failure(`This is Node.js ${process.versions.node}; Hoopwright needs ${OLDEST_NODE.join('.')} or newer.`, {
    todo: 'Install a newer Node.js and start again.',
  })
}

function table(rows) {
  const widths = rows[0].map((_, column) => Math.max(...rows.map((row) => row[column].length)))
  return rows.map((row) => row.map((cell, column) => cell.padEnd(widths[column])).join('   ').trimEnd())
}

function tellWhere({ appUrl, mailboxUrl, own, logs }) {
  const lines = ['', `  Hoopwright   ${appUrl}`]
  if (mailboxUrl) lines.push(`  Mailbox      ${mailboxUrl}   (every mail it sends lands here)`)
  const peopleFile = join(root, 'db', 'seed', 'demo-people.json')
  if (!own.database && existsSync(peopleFile)) {
    const people = JSON.parse(readFileSync(peopleFile, 'utf8'))
    const rows = people.map(({ name, email, password, roles }) => [email, password, `${name}, ${roles.join(' and ')}`])
    lines.push('', ...table([['Demo sign-in', 'Password', 'Who'], ...rows]).map((row) => `  ${row}`))
  }
  lines.push('', `  Logs in ${fromRoot(logs)}. Ctrl-C stops everything; what you did is kept.`, '')
  process.stdout.write(`${lines.join('\n')}\n`)
}

const env = readEnvFiles(root)

await runSession({ place: placeOf('start'), what: dev ? 'Hoopwright (npm run dev)' : 'Hoopwright (npm start)', env }, async (run) => {
  const { place, steps, processes, lock, tell } = run
  checkNode()
  const own = ownServices(env)
  const { port, moved } = await appPort({ asked: env['PORT'], usual: USUAL_PORT })
  if (moved) tell(`Port ${USUAL_PORT} is taken; using ${port}`)
  const appUrl = env['APP_URL'] || `http://127.0.0.1:${port}`
  const mailboxPort = own.mail ? null : await nextFreePort(USUAL_MAILBOX_PORT)
  const mailboxUrl = own.mail ? undefined : `http://127.0.0.1:${mailboxPort}`

  await preparePackages(run)
  const secrets = await prepareSecrets(run)
  let databaseUrl = env['DATABASE_URL']
  let cluster = null
  if (own.database) tell('Database: yours, as DATABASE_URL says')
  else {
    cluster = await prepareCluster(run, { programs: await preparePostgres(run), secrets })
    databaseUrl = cluster.url
  }
  mkdirSync(place.blobs, { recursive: true })
  const settings = appEnv({ env, secrets, databaseUrl, appUrl, mailboxUrl, blobDir: place.blobs })

  await steps.step('Tables', (say) => migrateDatabase({ processes, env: settings, say }))
  if (own.database) tell('Demo: not put into a database of your own; npm run db:seed does it')
  else await steps.step('Demo', (say) => seedDemo({ processes, env: settings, say }))
  if (!dev) await steps.step('Build', (say) => buildApp({ place, processes, env: settings, say }))

  const services = cluster ? [cluster.service] : []
  if (own.mail) tell('Mail: yours, as RESEND_API_KEY says')
  else {
    services.push(
      await steps.step('Mailbox', async (say) => {
        const service = await startMailbox({ processes, place, secrets, port: mailboxPort, appUrl: `http://127.0.0.1:${port}` })
        say(mailboxUrl)
        return service
      }),
    )
  }
  services.push(keepWorker({ processes, env: settings, dev, tell }))
  services.push(
    await steps.step('App', async (say) => {
      const service = await startApp({ processes, place, env: settings, port, dev })
      say(`ready at ${appUrl}`)
      return service
    }),
  )
  run.running = true
  lock.note({ running: true, address: appUrl, mailboxUrl })
  tellWhere({ appUrl, mailboxUrl, own, logs: place.logs })

  const died = await Promise.race(services.map(async (service) => ({ service, how: await service.ended })))
  if (processes.closed) return 0
  throw new Failure(`The ${died.service.name} ${died.how}; everything is stopped.`, {
    todo: 'What was saved is kept. Start again with npm start.',
    log: died.service.log,
  })
})
