import { inArray, sql } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { jobWorker } from '@/db/schema/job-worker'

export async function beatJobWorkers(db: Db, workerIds: string[]): Promise<void> {
  if (workerIds.length === 0) return
  await db
    .insert(jobWorker)
    .values(workerIds.map((workerId) => ({ workerId })))
    .onConflictDoUpdate({ target: jobWorker.workerId, set: { seenAt: sql`now()` } })
}

export async function forgetJobWorkers(db: Db, workerIds: string[]): Promise<void> {
  if (workerIds.length > 0) await db.delete(jobWorker).where(inArray(jobWorker.workerId, workerIds))
}

/** Frees the jobs of workers that have not been seen for a while; answers whose. */
export async function freeJobsOfDeadWorkers(db: Db, silentSeconds: number): Promise<string[]> {
  const dead = await db
    .delete(jobWorker)
    .where(sql`${jobWorker.seenAt} < now() - make_interval(secs => ${silentSeconds})`)
    .returning({ workerId: jobWorker.workerId })
  const ids = dead.map((row) => row.workerId)
  if (ids.length > 0) await db.execute(sql`select graphile_worker.force_unlock_workers(${sql.param(ids)}::text[])`)
  return ids
}
