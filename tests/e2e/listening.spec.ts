import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { expect, test, type Browser, type LaunchOptions, type PlaywrightWorkerArgs } from '@playwright/test'
import { struckHead } from '@/lib/listening/tap-head'
import type { TappedDrum } from '@/lib/listening/tap-head'
import { makeTap } from '@/lib/listening/tap-synth'
import { makeParty, type PartyFixture } from '../helpers/party-fixture'
import { writeTapWav } from '../helpers/tap-wav'
import { makeTour } from '../helpers/tour-fixture'
import { wavFile } from '../helpers/wav-file'
import { pageOf } from './member-page'

const film = { plyMils: [10], coatingKgPerM2: 0 }
/** The fixture's Tom 12, both heads at 2000 N/m: note 146.37 Hz, tap with the other head damped 255.32 Hz, ratio 1.744 (derived). */
const tom: TappedDrum = {
  drum: { diameterM: 0.3048, depthM: 0.2032, batter: film, resonant: film },
  tension: { batterNPerM: 2000, resonantNPerM: 2000 },
  ...{ struck: 'batter', otherHead: 'damped', fingerOnCentre: true },
  ...{ decayT60S: 0.8, splitHz: 0, axisRad: 0 },
}
const folder = mkdtempSync(join(tmpdir(), 'microphone-'))
/** What the microphone hears, round and round; read again each time that a page opens it. */
const wav = join(folder, 'microphone.wav')
let party: PartyFixture
test.beforeAll(async () => {
  party = await makeParty()
})
test.afterAll(() => rmSync(folder, { recursive: true }))

/** A browser whose microphone is that file, allowed without being asked for, or refused. */
function withMicrophone(
  playwright: PlaywrightWorkerArgs['playwright'],
  { args = [], ...options }: LaunchOptions,
  allowed: '--use-fake-ui-for-media-stream' | '--deny-permission-prompts',
): Promise<Browser> {
  const microphone = ['--use-fake-device-for-media-stream', `--use-file-for-fake-audio-capture=${wav}`, allowed]
  return playwright.chromium.launch({ ...options, args: [...args, ...microphone] })
}

test('a tap is heard for a pair of a gauge and fills its field', async ({ playwright, launchOptions }) => {
  const [tap] = writeTapWav(wav, { drum: tom, lugs: 3, everyS: 0.9, seed: 7 })
  if (!tap) throw new Error('no tap was written')
  const gauge = { name: 'Brass gauge', scale: { min: 0, max: 100, step: 1 }, remark: '' }
  const { id } = (await party.drumTech.call('POST', '/api/gauges', { gauge })).body as { id: string }
  const browser = await withMicrophone(playwright, launchOptions, '--use-fake-ui-for-media-stream')
  const page = await pageOf(browser, party.drumTech)
  await page.goto(`/party/gauges/${id}`)
  await page.getByRole('button', { name: 'Add the first pair' }).click()
  const field = page.getByLabel('Tap', { exact: true })
  await expect(field).toHaveValue('')
  await page.getByRole('button', { name: 'Listen for the tap' }).click()
  await expect(page.getByRole('meter', { name: 'Microphone level' })).toBeVisible()
  await expect(page.getByText(/Tap filled in: .*median of [2-5], from/)).toBeVisible()
  const heard = Number(await field.inputValue())
  expect(Math.abs(heard / tap.pitchHz - 1)).toBeLessThan(0.01)
  await page.getByRole('button', { name: 'Stop listening' }).click()
  await page.getByLabel('Gauge reads').fill('77')
  await page.getByRole('button', { name: 'Add this pair' }).click()
  await expect(page.getByRole('heading', { name: 'Pairs 1' })).toBeVisible()
  await expect(page.getByRole('cell', { name: new RegExp(`^${heard.toFixed(1)}`) })).toBeVisible()
  await browser.close()
})

test('tap over note is measured by ear on the drum’s form, and what makes no sense fills nothing', async ({
  playwright,
  launchOptions,
}) => {
  writeFileSync(wav, strokes(['note', 'tap', 'note', 'note']))
  const tour = await makeTour(party)
  const browser = await withMicrophone(playwright, launchOptions, '--use-fake-ui-for-media-stream')
  const page = await pageOf(browser, party.drumTech)
  await page.goto(`/tours/${tour.tourId}/kit?rig=${tour.rigId}`)
  await page.getByRole('button', { name: 'Edit Tom 12' }).click()
  const field = page.getByLabel(/^Tap over note, measured/)
  await page.getByRole('button', { name: 'Measure tap over note by the microphone' }).click()
  await expect(page.getByText('Hear both: the note 3 times and the tap 3 times or more.')).toBeVisible()
  await page.getByRole('button', { name: 'Listen for the note' }).click()
  // What is not the note is refused in words and fills nothing.
  await expect(page.getByText('Strike the centre with both heads free.').first()).toBeVisible()
  await expect(field).toHaveValue('')
  await expect(page.getByText(/median of 3/)).toBeVisible()
  // The file is read again when the microphone is opened again: now the other head is damped.
  writeFileSync(wav, strokes(['tap', 'tap', 'tap']))
  await page.getByRole('radio', { name: 'The batter’s tap' }).check({ force: true })
  await page.getByRole('button', { name: 'Listen for the tap' }).click()
  const use = page.getByRole('button', { name: /^Use 1\.7\d+$/ })
  await use.click()
  await expect(field).toBeFocused()
  expect(Math.abs(Number(await field.inputValue()) / 1.744 - 1)).toBeLessThan(0.01)
  await page.getByRole('button', { name: 'Save changes' }).click()
  await expect(page.getByText('Tom 12 is saved.')).toBeVisible()
  await browser.close()
})

test('a microphone that is refused says what to do, and typing stays', async ({ playwright, launchOptions }) => {
  const tour = await makeTour(party)
  const browser = await withMicrophone(playwright, launchOptions, '--deny-permission-prompts')
  const page = await pageOf(browser, party.drumTech)
  await page.goto(`/tours/${tour.tourId}/kit?rig=${tour.rigId}`)
  await page.getByRole('button', { name: 'Edit Tom 12' }).click()
  await page.getByRole('button', { name: 'Measure tap over note by the microphone' }).click()
  await page.getByRole('button', { name: 'Listen for the note' }).click()
  await expect(page.getByText(/The microphone is not allowed here\. Allow it in the browser’s settings/)).toBeVisible()
  await page.getByLabel(/^Tap over note, measured/).fill('1.72')
  await page.getByRole('button', { name: 'Save changes' }).click()
  await expect(page.getByText('Tom 12 is saved.')).toBeVisible()
  await browser.close()
})

/** Strokes on the centre with both heads free, and taps by a lug with the other damped. */
function strokes(kinds: readonly ('note' | 'tap')[]): Buffer {
  const sampleRateHz = 48_000
  const everyS = 0.8
  const sound = new Float64Array(Math.round(kinds.length * everyS * sampleRateHz))
  kinds.forEach((kind, index) => {
    const at = { radiusShare: kind === 'note' ? 0.1 : 0.83, angleRad: index }
    const made = makeTap({
      head: struckHead(kind === 'note' ? { ...tom, otherHead: 'open', fingerOnCentre: false } : tom),
      strike: { stick: at, microphone: { ...at, heightM: 0.1 }, contactS: 0.002 },
      ...{ seed: index + 1, sampleRateHz, leadS: 0, lengthS: everyS - 0.1 },
      noise: { colour: 'pink', snrDb: 45 },
    })
    made.samples.forEach((value, i) => (sound[Math.round((0.1 + index * everyS) * sampleRateHz) + i] = value))
  })
  return wavFile(sound, sampleRateHz)
}
