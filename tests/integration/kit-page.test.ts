import { beforeAll, describe, expect, it } from 'vitest'
import { stranger } from '../helpers/http-client'
import type { HttpClient } from '../helpers/http-client'
import { makeParty, type PartyFixture } from '../helpers/party-fixture'
import { makeTour, type TourFixture } from '../helpers/tour-fixture'

/**
 * The page's figures against the closed form, worked out here and nowhere near the code: a 12 in head of 10 mil film, as the
 * fixture's Tom 12 has on both sides, in the open air. Air loads 1.4928 (note) and 0.6602 (tap) and ρ 1.2041 kg/m³ at 20 °C: derived
 * and published values of the model's own sources; j01 and j11: Abramowitz & Stegun 9.5.
 */
const radiusM = 0.1524
const j01 = 2.404825557696
const j11 = 3.831705970208
const film = 1390 * 254e-6
const moving = (beta: number) => film + beta * 1.2041 * radiusM
const tapRatio = (j11 / j01) * Math.sqrt(moving(1.4928) / moving(0.6602))

describe('the kit page', () => {
  let party: PartyFixture
  let tour: TourFixture
  let page: string

  beforeAll(async () => {
    party = await makeParty()
    tour = await makeTour(party)
    page = `/tours/${tour.tourId}/kit`
  })
  /** The words that a page shows, without its markup and scripts. */
  const words = async (call: HttpClient, path: string) => {
    const answer = await call('GET', path)
    expect(answer.status).toBe(200)
    return String(answer.body)
      .replace(/<script[\s\S]*?<\/script>/g, '')
      .replace(/<!--.*?-->/g, '')
      .replace(/<[^>]+>/g, ' ')
      .replace(/\s+/g, ' ')
  }

  it('shows a drum with its size in inches and millimetres, its note, and the tap of either head with its bounds', async () => {
    const shown = await words(party.drumTech.call, page)
    expect(shown).toContain('12 in across, 8 deep (305 × 203 mm)')
    expect(shown).toContain('6 lugs a head, rented')
    // D3 over A4 = 440 Hz (ISO 16:1975).
    const noteHz = 440 * 2 ** ((50 - 69) / 12)
    expect(noteHz.toFixed(1)).toBe('146.8')
    expect(shown).toContain('146.8 Hz D3')
    // From the ideal membrane's ratio, to 2 % over the open-air ratio (Rossing's scatter).
    const bounds = `${Math.round((noteHz * j11) / j01)}–${Math.round(noteHz * tapRatio * 1.02)}`
    const taps = shown.split(`tap ${(noteHz * tapRatio).toFixed(1)} Hz ${bounds} gauge 75`)
    expect(taps).toHaveLength(3)
  })

  it('shows in the notes view what the note asks of film and rods', async () => {
    const shown = await words(party.drumTech.call, `${page}?rig=${tour.rigId}&view=notes`)
    const noteHz = 440 * 2 ** ((50 - 69) / 12)
    const tension = moving(1.4928) * ((2 * Math.PI * radiusM * noteHz) / j01) ** 2
    const pull = (2 * Math.PI * radiusM * tension) / 6
    expect(shown).toContain(`film ${(tension / 1000).toFixed(2)} kN/m`)
    expect(shown).toContain(`each rod ${Math.round(pull)} N`)
    expect(shown).toContain('Why these numbers')
    expect(shown).toContain('in the open air')
    expect(shown).toContain('Film and rods.')
  })

  it('lets readers read and only a drum tech edit', async () => {
    for (const member of [party.owner, party.tourManager, party.viewer]) {
      expect(await words(member.call, page)).not.toContain('Add a drum')
      expect(await words(member.call, `${page}?view=notes`)).not.toContain('Set notes')
    }
    expect(await words(party.drumTech.call, page)).toContain('Add a drum')
    expect(await words(party.drumTech.call, `${page}?view=notes`)).toContain('Set notes')
  })

  it('is closed to strangers and other parties, and knows no other tour’s rig', async () => {
    expect((await stranger('GET', page)).status).toBe(307)
    const other = await makeParty()
    const theirs = await makeTour(other)
    const said = async (call: HttpClient, path: string) => String((await call('GET', path)).body)
    for (const body of [
      await said(other.drumTech.call, page),
      await said(party.drumTech.call, `${page}?rig=${theirs.rigId}`),
      await said(party.drumTech.call, `${page}?rig=nonsense`),
    ])
      expect(body).not.toContain('Tom 12')
  })
})
