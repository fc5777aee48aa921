import { sql } from 'drizzle-orm'
import type { Db } from '@/db/client'
import type { TaskName, TaskPayloads } from './task-names'

/**
 * Puts a job into the queue in the caller's transaction: it exists exactly if the change does.
 * Of the jobs that are due, the lowest `priority` goes first: mail (0), then a PDF that somebody waits for, then those that go by mail.
 */
export async function enqueue<Name extends TaskName>(
  tx: Db,
  task: Name,
  payload: TaskPayloads[Name],
  options: { runAt?: Date; key?: string; maxAttempts?: number; priority?: number } = {},
): Promise<void> {
  await tx.execute(sql`select graphile_worker.add_job(
    ${task},
    ${JSON.stringify(payload)}::json,
    run_at => ${options.runAt ? options.runAt.toISOString() : null}::timestamptz,
    job_key => ${options.key ?? null},
    max_attempts => ${options.maxAttempts ?? 20}::smallint,
    priority => ${options.priority ?? 0}::integer
  )`)
}
