import { expect, test, type Page } from '@playwright/test'
import { makeParty } from '../helpers/party-fixture'
import { makeTour } from '../helpers/tour-fixture'
import { pageOf } from './member-page'

const sheetOf = (page: Page) => page.getByRole('group', { name: /^Plot, seen from above/ })
const saved = (page: Page) => expect(page.getByText('saved', { exact: true })).toBeVisible()

async function dragTo(page: Page, what: string, to: { x: number; y: number }) {
  const item = page.getByRole('button', { name: what })
  const from = await item.boundingBox()
  const sheet = await sheetOf(page).boundingBox()
  if (!from || !sheet) throw new Error('shelf and sheet are on the page')
  await page.mouse.move(from.x + 20, from.y + 10)
  await page.mouse.down()
  await page.mouse.move(from.x + 60, from.y + 20, { steps: 4 })
  await page.mouse.move(sheet.x + to.x, sheet.y + to.y, { steps: 8 })
  await page.mouse.up()
}

test('a plot is made by mouse and by keys, is seen by others as it is made, and loses nothing without a connection', async ({
  browser,
}) => {
  const party = await makeParty()
  const tour = await makeTour(party)
  const path = `/tours/${tour.tourId}/plot?rig=${tour.rigId}`
  const tech = await pageOf(browser, party.drumTech)
  const viewer = await pageOf(browser, party.viewer)
  await tech.goto(path)
  await viewer.goto(path)
  await expect(sheetOf(viewer)).toBeVisible()
  await expect(viewer.getByRole('heading', { name: 'Not on the plot yet' })).toHaveCount(0)

  await dragTo(tech, 'Tom 12', { x: 300, y: 200 })
  const tom = (page: Page) => page.getByRole('button', { name: /^Tom 12, 12 in across, 8 deep, 6 lugs/ })
  await expect(tom(tech)).toHaveCount(1)
  await expect(tom(tech).locator('[data-part="lug"]')).toHaveCount(6)
  await saved(tech)
  await expect(tom(viewer)).toHaveCount(1)

  await tech.getByRole('button', { name: 'Ride 21' }).press('Enter')
  const ride = (page: Page) => page.getByRole('button', { name: /^Ride 21, ride, 21 in/ })
  await expect(ride(viewer)).toHaveCount(1)
  await expect(tech.getByText('Everything in the kit is on the plot.')).toBeVisible()

  // A wedge, carried by keys: the first arrow takes it over the plot, Space puts it down.
  const wedge = tech.getByRole('button', { name: /^Wedge 0.6/ })
  await wedge.press('Space')
  await expect(tech.getByText('Wedge picked up')).toBeAttached()
  await tech.keyboard.press('ArrowRight')
  await expect(tech.getByText('Wedge is over the plot')).toBeAttached()
  await tech.keyboard.press('Space')
  await expect(tech.getByRole('button', { name: /^Wedge, Wedge, 0.6 m wide/ })).toHaveCount(1)

  // Stage left is to the right and upstage up, whichever way it is moved; the tom is chosen by its own button.
  await tom(tech).press('Enter')
  const left = tech.getByLabel('To stage left')
  const upstage = tech.getByLabel('Upstage', { exact: true })
  await left.fill('1.2 m')
  await left.press('Enter')
  await upstage.fill('300 cm')
  await upstage.press('Enter')
  await expect(tom(viewer)).toHaveAccessibleName(/1\.2 m stage left, 3 m upstage/)
  await tom(tech).press('ArrowRight')
  await tom(tech).press('Shift+ArrowUp')
  await expect(tom(viewer)).toHaveAccessibleName(/1\.25 m stage left, 3\.5 m upstage/)
  await tom(tech).press('Control+z')
  await expect(tom(viewer)).toHaveAccessibleName(/1\.25 m stage left, 3 m upstage/)
  await left.fill('far away')
  await left.press('Enter')
  await expect(tech.getByText('Write a length such as')).toBeVisible()
  await left.press('Escape')

  await tech.context().setOffline(true)
  await tom(tech).press('ArrowLeft')
  await expect(tech.getByText('not saved yet, kept on this device')).toBeVisible()
  await expect(tom(tech)).toHaveAccessibleName(/1\.2 m stage left/)
  await expect(tom(viewer)).toHaveAccessibleName(/1\.25 m stage left/)

  // Meanwhile the tech's other device takes the ride off; back on line, both changes stand.
  const second = await pageOf(browser, party.drumTech)
  await second.goto(path)
  await ride(second).press('Enter')
  await sheetOf(second).press('Delete')
  await saved(second)
  await tech.context().setOffline(false)
  await saved(tech)
  await expect(tom(viewer)).toHaveAccessibleName(/1\.2 m stage left/)
  await expect(ride(tech)).toHaveCount(0)
  await expect(ride(viewer)).toHaveCount(0)
  for (const page of [tech, viewer, second]) await page.context().close()
})
