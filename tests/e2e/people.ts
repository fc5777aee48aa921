import type { Browser, BrowserContext, Page } from '@playwright/test'
import { devices } from '@playwright/test'
import people from '../../db/seed/demo-people.json' with { type: 'json' }

type Role = 'owner' | 'drum-tech' | 'tour-manager' | 'viewer'

/** A desk of one of the demo's people, signed in by the form as they would. */
export async function deskOf(browser: Browser, role: Role): Promise<Page> {
  const person = people.find(({ roles }) => roles.includes(role))
  if (!person) throw new Error(`the demo has no ${role}`)
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 } })
  const page = await context.newPage()
  await page.goto('/sign-in')
  await page.getByLabel('E-mail', { exact: true }).fill(person.email)
  await page.getByLabel('Password', { exact: true }).fill(person.password)
  await page.getByRole('button', { name: 'Sign in', exact: true }).click()
  await page.waitForURL('**/tours')
  return page
}

/** A phone without an account. */
export function phone(browser: Browser): Promise<BrowserContext> {
  return browser.newContext({ ...devices['Pixel 7'], viewport: { width: 390, height: 844 } })
}

export function mailboxUrl(): string {
  const url = process.env['MAILBOX_URL']
  if (!url) throw new Error('MAILBOX_URL is not set')
  return url
}

type MailSeen = { id: string; subject: string; text: string; links: string[]; attachments: { path: string }[] }

/** The newest mail to an address whose subject fits; waits until there is one. */
export async function mailTo(address: string, subject: string): Promise<MailSeen> {
  const query = new URLSearchParams({ to: address, subject, wait: '60000' })
  const answer = await fetch(`${mailboxUrl()}/api/mails?${query.toString()}`)
  const { mails } = (await answer.json()) as { mails: MailSeen[] }
  const [newest] = mails
  if (!newest) throw new Error(`no mail to ${address} about “${subject}” came`)
  return newest
}
