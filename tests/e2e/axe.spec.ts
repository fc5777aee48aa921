import { readdirSync } from 'node:fs'
import { join } from 'node:path'
import AxeBuilder from '@axe-core/playwright'
import { expect, test, type Browser, type Page } from '@playwright/test'
import { deskOf, mailTo, phone } from './people'

// Every role opens every page. What takes long, each text's contrast, is measured once in each theme: with the two roles that
// have the most to press.
const desks = [
  { role: 'drum-tech', theme: 'paper', besides: [] },
  { role: 'tour-manager', theme: 'stage', besides: [] },
  { role: 'owner', theme: 'paper', besides: ['color-contrast'] },
  { role: 'viewer', theme: 'stage', besides: ['color-contrast'] },
] as const
const root = join(import.meta.dirname, '../..')

/** The addresses of the pages in a folder of `app`, a part between brackets as ":". */
function pagesIn(folder: string): string[] {
  return readdirSync(join(root, 'app', folder), { recursive: true, encoding: 'utf8' })
    .filter((file) => /(^|\/)page\.tsx$/.test(file))
    .map(
      (file) =>
        `/${file
          .replace(/\/?page\.tsx$/, '')
          .replace(/\([^)]+\)\/?/g, '')
          .replace(/\/$/, '')
          .replace(/\[[^\]]+\]/g, ':')}`,
    )
    .sort()
}

const patternOf = (path: string) => path.replace(/[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}/g, ':')

/** Adds an address of every desk page that a person's pages name, each page by the ones before it. */
async function addAddresses(page: Page, found: Map<string, string>): Promise<void> {
  for (const path of found.values()) {
    const text = await (await page.request.get(path)).text()
    for (const [address] of text.matchAll(/\/(tours|directory|party)(\/[\w-]+)*(?=[?"\\])/g)) {
      if (!found.has(patternOf(address))) found.set(patternOf(address), address)
    }
  }
}

interface Held {
  /** The least impact that is not allowed: serious and critical, or anything at all. */
  readonly none: boolean
  /** Rules that are left out. */
  readonly besides?: readonly string[]
}

/** What axe finds on the page as it stands, in the theme it stands in. */
async function violations(page: Page, where: string, held: Held): Promise<string[]> {
  const { violations } = await new AxeBuilder({ page })
    .setLegacyMode()
    .options({ resultTypes: ['violations'] })
    .disableRules([...(held.besides ?? [])])
    .analyze()
  return violations
    .filter(({ impact }) => held.none || impact === 'serious' || impact === 'critical')
    .map(({ id, nodes }) => `${where}: ${id}, ${nodes.map(({ target }) => target.join(' ')).join(' | ')}`)
}

type Theme = 'paper' | 'stage'

/** What axe finds at an address in a theme, where the theme follows the device. */
async function violationsAt(page: Page, path: string, theme: Theme, held: Held): Promise<string[]> {
  await page.emulateMedia({ colorScheme: theme === 'paper' ? 'light' : 'dark', reducedMotion: 'reduce' })
  await page.goto(path)
  await expect(page.locator('#main')).toBeVisible()
  return violations(page, `${path} (${theme})`, held)
}

async function newPhone(browser: Browser): Promise<Page> {
  return (await phone(browser)).newPage()
}

// The page of a new party is named in a menu, which is made when it opens.
const addresses = new Map(['/tours', '/party/new'].map((path) => [path, path]))

test.beforeAll(async ({ browser }) => {
  for (const role of ['owner', 'drum-tech'] as const) {
    const page = await deskOf(browser, role)
    await addAddresses(page, addresses)
    await page.context().close()
  }
})

/** Every desk page, and of the kit its other view too, which is a page of its own but for its address. */
function deskPaths(): string[] {
  return [...addresses.values()].flatMap((path) => (path.endsWith('/kit') ? [path, `${path}?view=notes`] : [path]))
}

test('links lead to every desk page', () => {
  // A tour's own address only leads on to its run.
  const pages = pagesIn('(desk)').filter((pattern) => pattern !== '/tours/:')
  expect(pages.filter((pattern) => !addresses.has(pattern))).toEqual([])
})

for (const { role, theme, besides } of desks) {
  test(`axe finds nothing serious on any desk page of the ${role}`, async ({ browser }) => {
    const page = await deskOf(browser, role)
    const found: string[] = []
    for (const path of deskPaths()) {
      found.push(...(await violationsAt(page, path, theme, { none: false, besides })))
    }
    expect(found).toEqual([])
    await page.context().close()
  })
}

test('axe finds nothing serious before the sign-in, nor where there is nothing', async ({ browser }) => {
  const page = await newPhone(browser)
  const doors = pagesIn('(auth)').map((path) => path.replaceAll(':', 'not-a-link'))
  const found: string[] = []
  for (const path of ['/', ...doors, '/nowhere', '/r/not-a-link', '/b/not-a-link']) {
    for (const theme of ['paper', 'stage'] as const) {
      found.push(...(await violationsAt(page, path, theme, { none: false })))
    }
  }
  expect(found).toEqual([])
  await page.context().close()
})

test('axe finds nothing at all on the reply page', async ({ browser }) => {
  const page = await newPhone(browser)
  const [link] = (await mailTo('crew@opera-annex.example', 'Saltmarsh Radio')).links
  const path = new URL(link ?? '').pathname
  const found = [
    ...(await violationsAt(page, path, 'stage', { none: true })),
    ...(await violationsAt(page, path, 'paper', { none: true })),
  ]
  await page.getByRole('button', { name: 'Instead…' }).click()
  found.push(...(await violations(page, 'instead', { none: true })))
  await page.getByRole('button', { name: 'All as asked except…' }).click()
  found.push(...(await violations(page, 'all as asked except', { none: true })))
  expect(found).toEqual([])
  await page.context().close()
})

test('axe finds nothing at all on the bench, in the dark and in the sun', async ({ browser }) => {
  const desk = await deskOf(browser, 'drum-tech')
  const show = [...addresses.values()].find((path) => path.endsWith('/bench')) ?? ''
  await desk.goto(show)
  await desk.getByRole('button', { name: /^Print (a|the) bench link/ }).click()
  const href = await desk.getByText(/\/b\/[\w-]+$/).textContent()
  const page = await newPhone(browser)
  const found: string[] = []
  await page.emulateMedia({ reducedMotion: 'reduce' })
  await page.goto(href ?? '')
  for (const theme of ['stage', 'paper']) {
    found.push(...(await violations(page, `bench (${theme})`, { none: true })))
    await page.getByRole('listitem').getByRole('link').first().click()
    await expect(page.getByLabel(/^What lug/)).toBeVisible()
    found.push(...(await violations(page, `head (${theme})`, { none: true })))
    await page.getByRole('link', { name: 'All drums' }).click()
    if (theme === 'stage') await page.getByRole('button', { name: 'Sun' }).click()
  }
  expect(found).toEqual([])
  await page.context().close()
  await desk.context().close()
})
