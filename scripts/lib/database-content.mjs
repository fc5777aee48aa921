import { typescriptCommand } from './typescript.mjs'
import { readFileSync } from 'node:fs'
import { Failure } from './failure.mjs'

/** What a program of ours said last on its error output, as the sentence it is. */
function lastSentence(log) {
  const lines = readFileSync(log, 'utf8').trim().split('\n')
  return lines.at(-1)?.trim() || null
}

async function runProgram({ processes, name, file, env, failure, say }) {
  const [command, args] = typescriptCommand(file)
  const { ok, stdout, log } = await processes.run(name, command, args, { env, capture: true, allowFailure: true })
  if (!ok) throw new Failure(lastSentence(log) ?? failure, { todo: 'The database is kept as it was.', log })
  say(stdout.trim().split('\n').at(-1) || 'done')
}

/** Brings the database up to this release; one that is newer than this release is refused. */
export const migrateDatabase = ({ processes, env, say }) =>
  runProgram({ processes, name: 'migrate', file: 'db/migrate.ts', env, failure: 'The database could not be migrated.', say })

/** Makes the demo party, once. */
export const seedDemo = ({ processes, env, say }) =>
  runProgram({ processes, name: 'seed', file: 'db/seed/demo.ts', env, failure: 'The demo could not be made.', say })
