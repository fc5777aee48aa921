import { checkHealth } from '@/lib/server/health/check-health'

export const dynamic = 'force-dynamic'

/** For a balancer or a person: 200 when this process answers and its database does. */
export async function GET(): Promise<Response> {
  const health = await checkHealth()
  return Response.json(health, { status: health.ok ? 200 : 503, headers: { 'Cache-Control': 'no-store' } })
}
