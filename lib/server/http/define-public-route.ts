import type { z } from 'zod'
import type { LinkActor } from '@/lib/server/auth/actor'
import { linkActor } from '@/lib/server/auth/link-actor'
import type { RouteContext } from './define-route'
import { parseRequest } from './define-route'
import { clientAddress } from './client-address'
import { errorResponse } from './error-response'
import { takeFromLinkLimit } from './link-limit'
import { parseAnswer } from './parse-input'
import type { Limit } from './rate-limit'
import { takeFromLimit } from './rate-limit'
import { assertSameOrigin } from './same-origin'

type Output<Schema> = Schema extends z.ZodType ? z.output<Schema> : undefined

/** A route behind a link (params.token): the token is one permission on one show or hire, and every use is counted. */
export function definePublicRoute<
  Response_ extends z.ZodType,
  Query extends z.ZodType | undefined = undefined,
  Body extends z.ZodType | undefined = undefined,
>(route: {
  purpose: LinkActor['purpose']
  query?: Query
  body?: Body
  response: Response_
  status?: number
  maxBytes?: number
  handler: (input: { actor: LinkActor; query: Output<Query>; body: Output<Body>; request: Request }) => Promise<z.input<Response_>>
}) {
  return async (request: Request, context: RouteContext): Promise<Response> => {
    try {
      const { token } = await context.params
      await takeFromLinkLimit(clientAddress(request.headers))
      const actor = await linkActor(String(token), route.purpose, clientAddress(request.headers))
      if (request.method !== 'GET') assertSameOrigin(request)
      const { query, body } = await parseRequest(route, request, context)
      const answer = await route.handler({ actor, query: query as Output<Query>, body: body as Output<Body>, request })
      return Response.json(parseAnswer(route.response, answer), {
        status: route.status ?? 200,
        headers: { 'Cache-Control': 'no-store' },
      })
    } catch (error) {
      return errorResponse(error)
    }
  }
}

/** A route that anybody may call (ask for a reset, accept an invitation): nothing but its limit stands before it. */
export function defineOpenRoute<Response_ extends z.ZodType, Body extends z.ZodType | undefined = undefined>(route: {
  body?: Body
  response: Response_
  status?: number
  limit: Limit
  handler: (input: { body: Output<Body>; address: string; request: Request }) => Promise<z.input<Response_>>
}) {
  return async (request: Request, context: RouteContext): Promise<Response> => {
    try {
      const address = clientAddress(request.headers)
      await takeFromLimit(route.limit, address)
      if (request.method !== 'GET') assertSameOrigin(request)
      const { body } = await parseRequest(route, request, context)
      const answer = await route.handler({ body: body as Output<Body>, address, request })
      return Response.json(parseAnswer(route.response, answer), {
        status: route.status ?? 200,
        headers: { 'Cache-Control': 'no-store' },
      })
    } catch (error) {
      return errorResponse(error)
    }
  }
}
