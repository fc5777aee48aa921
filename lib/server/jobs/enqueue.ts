import { sql } from 'drizzle-orm'
import type { Db } from '@/db/client'
import type { TaskName, TaskPayloads } from './task-names'

/** Puts a job into the queue in the caller's transaction: it exists exactly if the change does. */
export async function enqueue<Name extends TaskName>(
  tx: Db,
  task: Name,
  payload: TaskPayloads[Name],
  options: { runAt?: Date; key?: string; maxAttempts?: number } = {},
): Promise<void> {
  await tx.execute(sql`select graphile_worker.add_job(
    ${task},
    ${JSON.stringify(payload)}::json,
    run_at => ${options.runAt ? options.runAt.toISOString() : null}::timestamptz,
    job_key => ${options.key ?? null},
    max_attempts => ${options.maxAttempts ?? 20}::smallint
  )`)
}
