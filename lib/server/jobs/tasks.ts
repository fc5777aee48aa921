import type { JobHelpers, TaskList } from 'graphile-worker'
import { log } from '@/lib/server/log'
import { makePackPdf } from './make-pack-pdf'
import { sendMail } from './send-mail'
import type { TaskName, TaskPayloads } from './task-names'

type Helpers = { readonly job: Pick<JobHelpers['job'], 'id' | 'attempts'> }

const implementations: {
  [Name in TaskName]: (payload: TaskPayloads[Name], helpers: Helpers) => Promise<void>
} = {
  'send-mail': (payload, helpers) => told('send-mail', helpers, () => sendMail(payload)),
  'make-pack-pdf': (payload, helpers) => told('make-pack-pdf', helpers, () => makePackPdf(payload, helpers.job)),
}

/**
 * Runs a task; what it throws goes to our own log, which keeps kinds and places only. The queue writes the words of an error
 * into its table and its messages, and those of a failed query hold the row that was written, so it gets none of them.
 */
async function told(task: TaskName, { job }: Helpers, run: () => Promise<void>): Promise<void> {
  try {
    await run()
  } catch (error) {
    log.error({ error, task, jobId: job.id, attempt: job.attempts }, 'a job failed')
    throw new Error(`${task} failed; the log says where`)
  }
}

/** The queue hands payloads over untyped; only `enqueue` writes them, and it is typed by the same table. */
export const tasks = implementations as unknown as TaskList
