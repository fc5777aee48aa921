import { errorResponse } from '@/lib/server/http/error-response'
import { readText } from '@/lib/server/http/request-body'
import { takeMailEvent } from '@/lib/server/mail/take-mail-event'

/** What the mail service tells of our mails. Its signature is over the very bytes, so the body is read as it came. */
export async function POST(request: Request): Promise<Response> {
  try {
    const body = await readText(request, 128 * 1024)
    const header = (name: string) => request.headers.get(`svix-${name}`)
    await takeMailEvent({ body, id: header('id'), timestamp: header('timestamp'), signature: header('signature') })
    return Response.json({ received: true }, { headers: { 'Cache-Control': 'no-store' } })
  } catch (error) {
    return errorResponse(error)
  }
}
