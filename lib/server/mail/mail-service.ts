import { Resend } from 'resend'
import { env } from '@/lib/env'

let made: Resend | undefined

/** The mail service's SDK. RESEND_BASE_URL, which the SDK reads itself, points it at the local fake. */
export function mailService(): Resend {
  made ??= new Resend(env().RESEND_API_KEY)
  return made
}
