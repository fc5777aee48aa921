import type { NextRequest } from 'next/server'
import { NextResponse } from 'next/server'
import { pathHeader } from '@/lib/server/auth/path-header'

/** Tells desk pages their own address, so that somebody who must sign in first comes back to the page they opened. */
export function proxy(request: NextRequest): NextResponse {
  const headers = new Headers(request.headers)
  headers.set(pathHeader, `${request.nextUrl.pathname}${request.nextUrl.search}`)
  return NextResponse.next({ request: { headers } })
}

export const config = { matcher: ['/tours/:path*', '/directory/:path*', '/party/:path*'] }
