import { integer, timestamp, uuid } from 'drizzle-orm/pg-core'

/** Columns that mean the same in every table. */
export const idColumn = () => uuid('id').primaryKey().defaultRandom()
export const partyIdColumn = () => uuid('party_id').notNull()
export const createdAtColumn = () => timestamp('created_at', { withTimezone: true, mode: 'date' }).notNull().defaultNow()
export const versionColumn = () => integer('version').notNull().default(1)
export const instant = (name: string) => timestamp(name, { withTimezone: true, mode: 'date' })
