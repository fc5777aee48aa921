import { env } from '@/lib/env'
import { AppError } from '@/lib/errors'

/** Refuses a change that another site's page sends with our cookie. Calls without a browser carry neither header. */
export function assertSameOrigin(request: Request): void {
  const fetchSite = request.headers.get('sec-fetch-site')
  if (fetchSite && fetchSite !== 'same-origin' && fetchSite !== 'none') refuse()
  const origin = request.headers.get('origin')
  if (origin && origin !== new URL(env().APP_URL).origin && new URL(origin).host !== request.headers.get('host')) refuse()
}

function refuse(): never {
  throw new AppError('forbidden', 'This change came from another site and was refused. Nothing was changed.')
}
