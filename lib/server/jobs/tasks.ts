import type { JobHelpers, TaskList } from 'graphile-worker'
import { makePackPdf } from './make-pack-pdf'
import { sendMail } from './send-mail'
import type { TaskName, TaskPayloads } from './task-names'

const implementations: {
  [Name in TaskName]: (payload: TaskPayloads[Name], helpers: Pick<JobHelpers, 'job'>) => Promise<void>
} = {
  'send-mail': (payload) => sendMail(payload),
  'make-pack-pdf': (payload, { job }) => makePackPdf(payload, job),
}

/** The queue hands payloads over untyped; only `enqueue` writes them, and it is typed by the same table. */
export const tasks = implementations as unknown as TaskList
