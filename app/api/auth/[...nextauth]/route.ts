import NextAuth from 'next-auth'
import type { RouteContext } from '@/lib/server/http/define-route'
import { errorResponse } from '@/lib/server/http/error-response'
import { assertSameOrigin } from '@/lib/server/http/same-origin'
import { authOptions } from '@/lib/server/auth/options'

const handler: (request: Request, context: unknown) => Promise<Response> = NextAuth(authOptions)

async function action(context: RouteContext): Promise<string> {
  const { nextauth } = await context.params
  return [nextauth].flat().join('/')
}

/** Opening an address signs nobody in: a mailed link leads to the page whose button does. */
export async function GET(request: Request, context: RouteContext): Promise<Response> {
  if ((await action(context)) !== 'callback/email') return handler(request, context)
  const asked = new URL(request.url).searchParams
  const given = new URLSearchParams()
  for (const name of ['email', 'token']) given.set(name, asked.get(name) ?? '')
  return new Response(null, { status: 303, headers: { Location: `/sign-in/link?${given}` } })
}

export async function POST(request: Request, context: RouteContext): Promise<Response> {
  try {
    const asked = await action(context)
    // Lets a browser write into our log; nothing of ours uses it.
    if (asked === '_log') return new Response(null, { status: 204 })
    // Next-auth checks its own token on every change but this one.
    if (asked === 'callback/email') assertSameOrigin(request)
    return await handler(request, context)
  } catch (error) {
    return errorResponse(error)
  }
}
