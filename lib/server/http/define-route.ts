import type { z } from 'zod'
import type { MemberActor } from '@/lib/server/auth/actor'
import { currentActor } from '@/lib/server/auth/current-actor'
import { errorResponse } from './error-response'
import { parseAnswer, parseInput } from './parse-input'
import { readJson } from './request-body'
import { assertSameOrigin } from './same-origin'

export type RouteContext = { params: Promise<Record<string, string | string[] | undefined>> }
type Output<Schema> = Schema extends z.ZodType ? z.output<Schema> : undefined

/**
 * A route for signed-in people, as a declaration. Order: who is it and in which party → parse → use case (which asserts
 * the permission first) → parse the answer.
 */
export function defineRoute<
  Response_ extends z.ZodType,
  Params extends z.ZodType | undefined = undefined,
  Query extends z.ZodType | undefined = undefined,
  Body extends z.ZodType | undefined = undefined,
>(route: {
  params?: Params
  query?: Query
  body?: Body
  response: Response_
  status?: number
  maxBytes?: number
  handler: (input: {
    actor: MemberActor
    params: Output<Params>
    query: Output<Query>
    body: Output<Body>
    request: Request
  }) => Promise<z.input<Response_>>
}) {
  return async (request: Request, context: RouteContext): Promise<Response> => {
    try {
      const actor = await currentActor()
      if (request.method !== 'GET') assertSameOrigin(request)
      const input = await parseRequest(route, request, context)
      const answer = await route.handler({ actor, request, ...input })
      return Response.json(parseAnswer(route.response, answer), {
        status: route.status ?? 200,
        headers: { 'Cache-Control': 'no-store' },
      })
    } catch (error) {
      return errorResponse(error)
    }
  }
}

/** What every kind of route reads from a request: path, query and body, each by its schema. */
export async function parseRequest<
  Params extends z.ZodType | undefined,
  Query extends z.ZodType | undefined,
  Body extends z.ZodType | undefined,
>(
  route: { params?: Params; query?: Query; body?: Body; maxBytes?: number },
  request: Request,
  context: RouteContext,
): Promise<{ params: Output<Params>; query: Output<Query>; body: Output<Body> }> {
  const read = async (schema: z.ZodType | undefined, value: () => unknown) =>
    schema ? parseInput(schema, await value()) : undefined
  // Each output type follows from the schema that was given; the conditional type is beyond what inference can prove.
  return {
    params: (await read(route.params, () => context.params)) as Output<Params>,
    query: (await read(route.query, () => Object.fromEntries(new URL(request.url).searchParams))) as Output<Query>,
    body: (await read(route.body, () => readJson(request, route.maxBytes ?? 256 * 1024))) as Output<Body>,
  }
}
