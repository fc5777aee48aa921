import { pool } from '@/db/client'
import { log } from '@/lib/server/log'

export type Health = { ok: boolean; database: 'answers' | 'does not answer' }

export async function checkHealth(): Promise<Health> {
  try {
    await pool().query('select 1 from party limit 1')
    return { ok: true, database: 'answers' }
  } catch (error) {
    log.error({ error }, 'health: the database does not answer')
    return { ok: false, database: 'does not answer' }
  }
}
