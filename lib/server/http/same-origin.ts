import { env } from '@/lib/env'
import { AppError } from '@/lib/errors'

/** Refuses a change that another site's page sends with our cookie. Calls without a browser carry neither header. */
export function assertSameOrigin(request: Request): void {
  const fetchSite = request.headers.get('sec-fetch-site')
  // The browser itself vouches; a page that hides its referrer sends the origin `null` even to its own site.
  if (fetchSite === 'same-origin') return
  if (fetchSite && fetchSite !== 'none') refuse()
  const origin = request.headers.get('origin')
  if (!origin) return
  if (!URL.canParse(origin)) refuse()
  if (origin !== new URL(env().APP_URL).origin && new URL(origin).host !== request.headers.get('host')) refuse()
}

function refuse(): never {
  throw new AppError('forbidden', 'This change came from another site and was refused. Nothing was changed.')
}
