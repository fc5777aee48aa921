import { bigint, integer, pgTable, varchar } from 'drizzle-orm/pg-core'

/** The counters of rate-limiter-flexible, in PostgreSQL so that every process counts together. Its columns are the package's. */
export const rateLimit = pgTable('rate_limit', {
  key: varchar('key', { length: 255 }).primaryKey(),
  points: integer('points').notNull().default(0),
  expire: bigint('expire', { mode: 'number' }),
})
