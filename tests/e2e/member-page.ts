import { encode } from 'next-auth/jwt'
import type { Browser, Page } from '@playwright/test'
import type { Member } from '../helpers/party-fixture'

/** A page of a signed-in member, as its device would hold it. */
export async function pageOf(browser: Browser, member: Member): Promise<Page> {
  const secret = process.env['NEXTAUTH_SECRET']
  const url = process.env['APP_URL']
  if (!secret || !url) throw new Error('NEXTAUTH_SECRET and APP_URL must be set: npm test sets them')
  const value = await encode({ token: { sub: member.personId, sessionId: member.sessionId }, secret })
  const context = await browser.newContext()
  await context.addCookies([{ name: 'next-auth.session-token', value, url, httpOnly: true, sameSite: 'Lax' }])
  return context.newPage()
}
