import { EventEmitter } from 'node:events'
import type { WorkerEvents } from 'graphile-worker'
import { Logger, run } from 'graphile-worker'
import { db, pool } from '@/db/client'
import { beatJobWorkers, forgetJobWorkers, freeJobsOfDeadWorkers } from '@/db/queries/job-worker'
import { log } from '@/lib/server/log'
import { tasks } from './tasks'

const beatMs = 5_000
const silentSeconds = 30

/** The job process. Any number may run; each takes jobs with SKIP LOCKED. SIGTERM lets running jobs finish. */
async function main(): Promise<void> {
  const events = new EventEmitter() as WorkerEvents
  const alive = new Set<string>()
  events.on('worker:create', ({ worker }) => alive.add(worker.workerId))
  const runner = await run({
    pgPool: pool(),
    concurrency: 4,
    pollInterval: 1000,
    taskList: tasks,
    events,
    logger: new Logger((scope) => (level, message) => {
      // The queue's own messages can hold payloads; only warnings matter, and payloads hold ids alone.
      if (level === 'error' || level === 'warning') log.warn({ worker: scope.workerId, task: scope.taskIdentifier }, message)
    }),
  })
  const beat = async () => {
    await beatJobWorkers(db(), [...alive])
    const dead = await db().transaction((tx) => freeJobsOfDeadWorkers(tx, silentSeconds))
    if (dead.length > 0) log.warn({ workers: dead.length }, 'freed the jobs of workers that stopped answering')
  }
  const quietly = () => beat().catch((error: unknown) => log.warn({ error }, 'the beat did not reach the database'))
  await quietly()
  const timer = setInterval(() => void quietly(), beatMs)
  log.info({ workers: alive.size }, 'worker is ready')
  await runner.promise
  clearInterval(timer)
  await forgetJobWorkers(db(), [...alive]).catch(() => undefined)
  await pool().end()
}

main().catch((error: unknown) => {
  log.fatal({ error }, 'worker stopped')
  process.exitCode = 1
})
