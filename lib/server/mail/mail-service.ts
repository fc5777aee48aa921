import { Resend } from 'resend'
import { env } from '@/lib/env'

/** The tag that carries our own id of a mail: a webhook that comes before the answer to the call still finds its mail by it. */
export const mailTag = 'mail_id'

let made: Resend | undefined

/** The mail service's SDK. RESEND_BASE_URL, which the SDK reads itself, points it at the local fake. */
export function mailService(): Resend {
  made ??= new Resend(env().RESEND_API_KEY)
  return made
}
