import type { z } from 'zod'
import type { SignedInPerson } from '@/lib/server/auth/current-actor'
import { currentPerson } from '@/lib/server/auth/current-actor'
import type { RouteContext } from './define-route'
import { parseRequest } from './define-route'
import { errorResponse } from './error-response'
import { parseAnswer } from './parse-input'
import { assertSameOrigin } from './same-origin'

type Output<Schema> = Schema extends z.ZodType ? z.output<Schema> : undefined

/** A route for what a signed-in person does with their own account, in whatever party or none. */
export function definePersonRoute<
  Response_ extends z.ZodType,
  Params extends z.ZodType | undefined = undefined,
  Body extends z.ZodType | undefined = undefined,
>(route: {
  params?: Params
  body?: Body
  response: Response_
  status?: number
  handler: (input: {
    person: SignedInPerson
    params: Output<Params>
    body: Output<Body>
  }) => Promise<z.input<Response_>>
}) {
  return async (request: Request, context: RouteContext): Promise<Response> => {
    try {
      const person = await currentPerson()
      if (request.method !== 'GET') assertSameOrigin(request)
      const { params, body } = await parseRequest(route, request, context)
      const answer = await route.handler({ person, params: params as Output<Params>, body: body as Output<Body> })
      return Response.json(parseAnswer(route.response, answer), {
        status: route.status ?? 200,
        headers: { 'Cache-Control': 'no-store' },
      })
    } catch (error) {
      return errorResponse(error)
    }
  }
}
