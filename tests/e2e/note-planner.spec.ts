import { randomUUID } from 'node:crypto'
import { expect, test, type Page } from '@playwright/test'
import { makeParty } from '../helpers/party-fixture'
import { makeTour, tomSpec } from '../helpers/tour-fixture'
import { pageOf } from './member-page'

const drum = (name: string, role: string, diameterIn: number) => ({
  id: randomUUID(),
  entry: {
    ...{ kind: 'drum', name, supply: 'rented', count: 1, remark: '' },
    spec: { ...tomSpec, role, diameterIn, insteadOf: null, note: null },
  },
})
const bead = (page: Page, name: string) => page.getByRole('slider', { name: `Note of ${name}` })
const noteOf = async (page: Page, name: string) =>
  (await bead(page, name).getAttribute('aria-valuetext'))?.split(',')[0] ?? ''
const names = ['Tom 10', 'Tom 12', 'Floor 14', 'Floor 16']
const notesOf = (page: Page) => Promise.all(names.map((name) => noteOf(page, name)))

test('notes are planned by the party’s own template, moved by mouse and keys, undone, kept on the device and set', async ({
  browser,
}) => {
  const party = await makeParty()
  const tour = await makeTour(party)
  const more = [drum('Tom 10', 'tom', 10), drum('Floor 14', 'floor-tom', 14), drum('Floor 16', 'floor-tom', 16)]
  await party.drumTech.call('POST', `/api/rigs/${tour.rigId}/kit/set`, { entries: more })
  const path = `/tours/${tour.tourId}/kit?rig=${tour.rigId}&view=notes`
  const tech = await pageOf(browser, party.drumTech)
  await tech.goto(path)

  await tech.getByRole('button', { name: 'Make a template from Fourths' }).click()
  await tech.getByLabel('Name').fill('Thirds down')
  await tech.getByRole('radio', { name: 'Pair by pair' }).check({ force: true })
  await tech.getByLabel('Semitones from tom to tom').fill('4, x')
  await tech.getByRole('button', { name: 'Keep this template' }).click()
  await expect(tech.getByText('write a number of semitones')).toBeVisible()
  await tech.getByLabel('Semitones from tom to tom').fill('4')
  await tech.getByRole('button', { name: 'Keep this template' }).click()
  const template = tech.getByLabel('Plan by')
  await expect(template.locator('option:checked')).toHaveText('Thirds down, the party’s own')

  // The anchor stays at its D3, every other drum gets a note, and one step takes them all back.
  await expect(bead(tech, 'Tom 10')).toHaveCount(0)
  await tech.getByRole('button', { name: 'Plan the notes' }).click()
  await expect(bead(tech, 'Tom 10')).toBeVisible()
  expect(await noteOf(tech, 'Tom 12')).toBe('D3')
  const planned = await notesOf(tech)
  expect(new Set(planned).size).toBe(4)
  await expect(tech.getByRole('button', { name: 'Set notes for 3 drums' })).toBeEnabled()
  await tech.getByRole('button', { name: /^Undo: plan by Thirds down from D3 on Tom 12/ }).click()
  await expect(bead(tech, 'Tom 10')).toHaveCount(0)
  await tech.getByRole('button', { name: /^Redo: plan by Thirds down/ }).click()
  await expect(bead(tech, 'Tom 10')).toBeVisible()
  expect(await notesOf(tech)).toEqual(planned)

  // By keys: a semitone, an octave, a cent, the edges; each with its undo.
  const tom = bead(tech, 'Tom 12')
  await tom.press('ArrowRight')
  await expect(tom).toHaveAttribute('aria-valuetext', /^D♯3, 155\.6 Hz/)
  await tom.press('Alt+ArrowLeft')
  await expect(tom).toHaveAttribute('aria-valuetext', /^D♯3 −1, /)
  await tom.press('Shift+ArrowDown')
  await expect(tom).toHaveAttribute('aria-valuetext', /^D♯2 −1, .*under its range: the head goes slack/)
  await tech.keyboard.press('Control+z')
  await tech.keyboard.press('Control+z')
  await tech.keyboard.press('Control+z')
  await expect(tom).toHaveAttribute('aria-valuetext', /^D3, /)
  await tech.keyboard.press('Control+Shift+z')
  await expect(tom).toHaveAttribute('aria-valuetext', /^D♯3, /)

  // Typed, by name or by frequency.
  const panel = tech.getByRole('region', { name: 'The note of Tom 12' })
  await panel.getByLabel('Note, or Hz').fill('banana')
  await panel.getByLabel('Note, or Hz').press('Enter')
  await expect(panel.getByText('write a note such as')).toBeVisible()
  await panel.getByLabel('Note, or Hz').fill('146.83')
  await panel.getByLabel('Note, or Hz').press('Enter')
  await expect(tom).toHaveAttribute('aria-valuetext', /^D3/)

  // By mouse, then by another plan: looked at, left, looked at again and kept.
  const floor = bead(tech, 'Floor 16')
  const before = await noteOf(tech, 'Floor 16')
  await floor.scrollIntoViewIfNeeded()
  const box = await floor.boundingBox()
  if (!box) throw new Error('the bead is on the page')
  await tech.mouse.move(box.x + box.width / 2, box.y + box.height / 2)
  await tech.mouse.down()
  await tech.mouse.move(box.x + box.width / 2 + 60, box.y + 30, { steps: 5 })
  await tech.mouse.up()
  await expect.poll(() => noteOf(tech, 'Floor 16')).not.toBe(before)
  const mine = await notesOf(tech)
  await expect(tech.getByRole('button', { name: `Undo: Floor 16 to ${mine[3]}` })).toBeEnabled()
  await tech.getByRole('button', { name: 'Look at plan 2' }).click()
  await expect(tech.getByText('Looking at plan 2; the rings are your plan.')).toBeVisible()
  await tech.getByRole('button', { name: 'Back to my plan' }).last().click()
  expect(await notesOf(tech)).toEqual(mine)
  await tech.getByRole('button', { name: 'Look at plan 2' }).click()
  await tech.getByRole('button', { name: 'Keep plan 2' }).last().click()
  await tech
    .getByRole('button', { name: 'Lock the note' })
    .or(tech.getByLabel(/^Lock the note of/))
    .check()
  const kept = await notesOf(tech)
  expect(kept).not.toEqual(mine)

  // The draft outlives the page; what is set is there for everybody.
  await tech.reload()
  await expect(tech.getByText('was kept on this device')).toBeVisible()
  expect(await notesOf(tech)).toEqual(kept)
  await tech.getByRole('button', { name: /^Set notes for \d drums$/ }).click()
  await expect(tech.getByText('The kit has these notes.')).toBeVisible()
  await tech.reload()
  await expect(tech.getByText('The kit has these notes.')).toBeVisible()
  expect(await notesOf(tech)).toEqual(kept)
  const viewer = await pageOf(browser, party.viewer)
  await viewer.goto(path)
  await expect(viewer.getByRole('img', { name: new RegExp(`^Floor 16: ${kept[3]}, `) })).toBeVisible()
  await expect(viewer.getByRole('slider')).toHaveCount(0)
  for (const page of [tech, viewer]) await page.context().close()
})
