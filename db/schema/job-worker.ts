import { pgTable, text } from 'drizzle-orm/pg-core'
import { instant } from './columns'

/** The job workers that live, by their beat: the queue keeps a killed worker's jobs locked for hours, this frees them within a minute. */
export const jobWorker = pgTable('job_worker', { workerId: text('worker_id').primaryKey(), seenAt: instant('seen_at').notNull().defaultNow() })
