import { spawn } from 'node:child_process'
import { appEnv, readEnvFiles } from './lib/app-env.mjs'
import { Failure } from './lib/failure.mjs'
import { holderOf } from './lib/lock.mjs'
import { placeOf, root } from './lib/place.mjs'
import { databaseUrl as localUrl, runningServer } from './lib/postgres-cluster.mjs'
import { clusterHome } from './lib/postgres-home.mjs'
import { keepSecrets } from './lib/secrets.mjs'
import { tellFailure } from './lib/session.mjs'
import { typescriptCommand } from './lib/typescript.mjs'

// One more worker as a process of its own: on the database that DATABASE_URL names, with the settings of a deployment, or beside the npm start that runs here.

function besideNpmStart(place, env) {
  const server = runningServer(clusterHome(place))
  const holder = holderOf(place.lockFile)
  if (!server || !holder?.running) {
    throw new Failure('There is no database to work on: DATABASE_URL is not set and npm start does not run here.', {
      todo: 'Set DATABASE_URL and the other settings of .env.example, or run npm start in another terminal first.',
    })
  }
  const { secrets } = keepSecrets(place.secretsFile)
  const databaseUrl = localUrl({ port: server.port, password: secrets.databasePassword })
  return appEnv({ env, secrets, databaseUrl, appUrl: holder.address, mailboxUrl: holder.mailboxUrl, blobDir: place.blobs })
}

try {
  const env = readEnvFiles(root)
  const settings = env['DATABASE_URL'] ? {} : besideNpmStart(placeOf('start'), env)
  const [command, args] = typescriptCommand('lib/server/jobs/worker.ts')
  const worker = spawn(command, args, { cwd: root, stdio: 'inherit', env: { NODE_ENV: 'production', ...env, ...settings } })
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => worker.kill(signal))
  worker.once('exit', (code, signal) => process.exit(code ?? (signal ? 1 : 0)))
} catch (error) {
  tellFailure(error)
  process.exit(1)
}
