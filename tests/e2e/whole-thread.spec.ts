import type { Page } from '@playwright/test'
import { expect, test } from '@playwright/test'
import { readPdf } from '../helpers/read-pdf'
import { deskOf, mailboxUrl, mailTo, phone } from './people'

/** The whole thread by its roles: kit → plot → revision → pack → answers → settled → bench → signed off. */

const crew = 'crew@lakeside.example'

async function openTour(page: Page): Promise<void> {
  await page.goto('/tours')
  await page.getByRole('link', { name: 'Low Water run' }).first().click()
  await expect(page.getByRole('heading', { level: 1, name: 'Low Water run' })).toBeVisible()
}

async function openPlace(page: Page, name: string): Promise<void> {
  await page.getByRole('link', { name, exact: true }).first().click()
  await expect(page.getByRole('heading', { level: 1, name: new RegExp(`^${name}`) })).toBeVisible()
}

async function addFloorTom(tech: Page): Promise<void> {
  await openPlace(tech, 'Kit')
  await tech.getByRole('button', { name: 'Add a drum' }).click()
  await tech.getByRole('menuitem', { name: 'A floor tom' }).click()
  const form = tech.getByRole('form').filter({ has: tech.getByLabel('What it is') })
  await form.getByLabel('Across', { exact: true }).fill('18')
  await form.getByLabel('Deep', { exact: true }).fill('16')
  await form.getByLabel('Name', { exact: true }).fill('Floor 18')
  await form.getByLabel(/^Brought by/).selectOption({ label: "the venue's" })
  await form.getByLabel(/^Note, or Hz/).fill('99999')
  await form.getByRole('button', { name: 'Add to the kit' }).click()
  // A note nobody can play is refused at its field, and what was typed stays.
  await expect(form.getByLabel(/^Note, or Hz/)).toHaveAttribute('aria-invalid', 'true')
  await expect(form.getByLabel('Name', { exact: true })).toHaveValue('Floor 18')
  await form.getByLabel(/^Note, or Hz/).fill('C2')
  await form.getByRole('button', { name: 'Add to the kit' }).click()
  const drum = tech.getByRole('listitem').filter({ has: tech.getByRole('heading', { name: 'Floor 18', exact: true }) })
  await expect(drum.getByText('65.4 Hz')).toBeVisible()
}

async function drawPlot(tech: Page): Promise<void> {
  await openPlace(tech, 'Plot')
  const shelf = tech.getByRole('region', { name: 'Not on the plot yet' })
  const sheet = tech.getByRole('group', { name: /^Plot, seen from above/ })
  // By mouse: from the shelf to the stage.
  const from = await shelf.getByRole('button', { name: /^Floor 18/ }).boundingBox()
  const stage = await sheet.boundingBox()
  if (!from || !stage) throw new Error('nothing to drag')
  await tech.mouse.move(from.x + from.width / 2, from.y + from.height / 2)
  await tech.mouse.down()
  await tech.mouse.move(from.x + 60, from.y + 30, { steps: 4 })
  await tech.mouse.move(stage.x + stage.width * 0.28, stage.y + stage.height * 0.5, { steps: 12 })
  await tech.mouse.up()
  await expect(sheet.getByRole('button', { name: /^Floor 18/ })).toBeVisible()
  await expect(shelf.getByRole('button', { name: /^Floor 18/ })).toHaveCount(0)
  // By keyboard: chosen on the shelf, placed with Enter, moved with arrows, taken back and forth.
  await shelf.getByRole('button', { name: /^Crash 18/ }).focus()
  await tech.keyboard.press('Enter')
  const crash = sheet.getByRole('button', { name: /^Crash 18/ })
  await expect(crash).toBeVisible()
  await crash.focus()
  const before = await crash.getAttribute('aria-label')
  await tech.keyboard.press('ArrowRight')
  await expect(crash).not.toHaveAttribute('aria-label', before ?? '')
  await tech.keyboard.press('Control+z')
  await expect(crash).toHaveAttribute('aria-label', before ?? '')
  await tech.keyboard.press('Control+Shift+z')
  await expect(crash).not.toHaveAttribute('aria-label', before ?? '')
  await expect(tech.getByRole('status').filter({ hasText: /^saved$/ })).toBeVisible()
  await tech.reload()
  await expect(sheet.getByRole('button', { name: /^Floor 18/ })).toBeVisible()
  await expect(sheet.getByRole('button', { name: /^Crash 18/ })).toBeVisible()
}

async function issueRevision(tech: Page): Promise<void> {
  await openPlace(tech, 'Revisions')
  await tech.getByLabel('Note').fill('A large floor tom for the lakeside.')
  await tech.getByRole('button', { name: /^Issue revision 3, full rig, \d+ shows$/ }).click()
  await expect(tech.getByRole('heading', { level: 1, name: /^Revision 3/ })).toBeVisible()
}

async function openLakeside(page: Page, place: 'Advance' | 'Bench'): Promise<void> {
  await openTour(page)
  await page.getByRole('link', { name: /Lakeside.*Orrin/ }).first().click()
  await openPlace(page, place)
}

async function sendPack(manager: Page): Promise<void> {
  await openLakeside(manager, 'Advance')
  // Held back and stopped: nothing leaves the house.
  await manager.getByLabel(/^Hold it back for 20 seconds/).check()
  await manager.getByRole('button', { name: 'Send revision 3 to Lakeside house crew' }).click()
  await manager.getByRole('button', { name: /^Stop/ }).first().click()
  await expect(manager.getByText(/stopped/i).first()).toBeVisible()
  // Sent.
  await manager.getByLabel(/^Hold it back for 20 seconds/).uncheck()
  await manager.getByRole('button', { name: 'Send revision 3 to Lakeside house crew' }).click()
}

test('a drum on the plot is the drum that is asked, answered, tuned and signed off', async ({ browser }) => {
  const tech = await deskOf(browser, 'drum-tech')
  await openTour(tech)
  await addFloorTom(tech)
  await drawPlot(tech)
  await issueRevision(tech)

  const manager = await deskOf(browser, 'tour-manager')
  await sendPack(manager)

  // The house crew opens the mail in the mailbox and the link in it, on a phone.
  const mail = await mailTo(crew, 'revision 3')
  const crewPhone = await phone(browser)
  const mailbox = await crewPhone.newPage()
  await mailbox.goto(`${mailboxUrl()}/mail/${mail.id}`)
  const opening = crewPhone.waitForEvent('page')
  await mailbox.frameLocator('iframe').getByRole('link', { name: /^Answer \d+ lines$/ }).click()
  const reply = await opening
  await expect(reply.getByRole('heading', { level: 1, name: /Lakeside/ })).toBeVisible()

  // The PDF says the same as the page.
  const file = await fetch(`${mailboxUrl()}${mail.attachments[0]?.path ?? ''}`)
  const pdf = await readPdf(new Uint8Array(await file.arrayBuffer()))
  expect(pdf.pages.length).toBeGreaterThanOrEqual(12)
  const text = pdf.pages.map((page) => page.text).join('\n')
  expect(text).toContain('Floor 18')
  expect(text).toContain('65.4')
  expect(text).toContain('Revision 3')
  expect(pdf.links).toContain(mail.links[0])

  // Answers: one instead, one that is not known yet, the rest as asked; each is kept as it is given.
  await reply.getByRole('button', { name: /^Answer line \d+, Floor 18/ }).click()
  const floor = reply.getByRole('listitem').filter({ has: reply.getByRole('heading', { name: /Floor 18/ }) })
  await floor.getByRole('button', { name: 'Instead…' }).click()
  await floor.getByRole('textbox', { name: 'Deep' }).fill('14')
  await floor.getByRole('button', { name: 'Keep this answer' }).click()
  await reply.getByLabel('Your name').fill('Basile')
  await reply.getByRole('button', { name: 'Keep my name and the answer' }).click()
  await expect(floor.getByText(/^instead/i)).toBeVisible()
  await reply.getByRole('button', { name: 'All as asked except…' }).click()
  await reply.getByRole('button', { name: /as asked$/ }).last().click()
  await reply.getByRole('button', { name: "That's all from us" }).click()

  // The tour manager sees it arrive without reloading, and settles it.
  await expect(manager.getByText(/Basile said that this is all/)).toBeVisible()
  await manager.getByRole('button', { name: /^Settle \d+ lines as asked$/ }).click()
  const floorLine = manager.getByRole('listitem').filter({ hasText: 'Floor 18' }).first()
  await floorLine.getByRole('button', { name: 'Settle' }).click()
  await expect(floorLine.getByText('settled').first()).toBeVisible()
  // The house crew sees that it is settled and cannot be changed any more.
  await expect(floor.getByText(/settled/).first()).toBeVisible()

  // The drum tech prints a bench link; the local tech opens it on another phone.
  await openLakeside(tech, 'Bench')
  await tech.getByRole('button', { name: /^Print (a|the) bench link/ }).click()
  const address = tech.getByText(/\/b\/[\w-]{43}$/)
  await expect(address).toBeVisible()
  const bench = await (await phone(browser)).newPage()
  await bench.goto((await address.textContent()) ?? '')
  const drum = bench.getByRole('listitem').filter({ has: bench.getByRole('heading', { name: 'Floor 18', exact: true }) })
  await expect(drum.getByText(/14 deep/).first()).toBeVisible()
  await drum.getByRole('link', { name: /^batter/ }).click()
  for (const reading of ['118', '119', '118', '126', '119', '118', '118', '126']) {
    await bench.getByLabel(/^What lug \d+ reads$/).fill(reading)
    await bench.keyboard.press('Enter')
  }
  // In the lug order of eight the fourth reading is lug 6's and the last is lug 8's.
  await expect(bench.getByRole('status').filter({ hasText: /lugs 6 and 8 are high/ })).toBeVisible()

  // The drum tech watches from anywhere.
  const watched = tech.getByRole('region', { name: 'Floor 18' })
  await expect(watched.getByText(/not signed off/)).toBeVisible()
  await expect(watched.getByRole('img', { name: /^Floor 18, batter: .*lugs 6 and 8 are high/ })).toBeVisible()
  await bench.getByLabel('Your name').fill('Sanna')
  await bench.getByRole('button', { name: /^Sign off/ }).click()
  await expect(watched.getByText(/Sanna/).first()).toBeVisible()

  // Who may only look sees the same and is offered no change.
  const viewer = await deskOf(browser, 'viewer')
  await openLakeside(viewer, 'Advance')
  await expect(viewer.getByText(/Basile said that this is all/)).toBeVisible()
  await expect(viewer.getByRole('button', { name: /^(Send|Settle)/ })).toHaveCount(0)
})
