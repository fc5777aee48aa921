import type { Instrumentation } from 'next'

/** Every error of a page or route, logged by its route's pattern: the address itself can hold a link's secret. */
export const onRequestError: Instrumentation.onRequestError = async (error, _request, context) => {
  if (process.env['NEXT_RUNTIME'] !== 'nodejs') return
  const { log } = await import('@/lib/server/log')
  log.error(
    {
      error,
      digest: error instanceof Error && 'digest' in error ? String(error.digest) : undefined,
      route: context.routePath,
      routeType: context.routeType,
      renderSource: context.renderSource,
    },
    'a request failed',
  )
}
