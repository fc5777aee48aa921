import type { Limit } from '@/lib/server/http/rate-limit'
import { takeFromLimit } from '@/lib/server/http/rate-limit'

const mailsPerReader: Limit = { name: 'sign-in-mail', points: 5, seconds: 900 }
const mailsPerAddress: Limit = { name: 'sign-in-mail-address', points: 30, seconds: 900 }

/** Counts a mail to somebody's own address that anybody can ask for; throws rate-limited. Known or not counts the same. */
export async function takeFromMailLimits(email: string, address: string): Promise<void> {
  await takeFromLimit(mailsPerAddress, address)
  await takeFromLimit(mailsPerReader, email)
}
