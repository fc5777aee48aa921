import { beforeAll, describe, expect, it } from 'vitest'
import { stranger } from '../helpers/http-client'
import type { HttpClient } from '../helpers/http-client'
import { makeParty, type PartyFixture } from '../helpers/party-fixture'
import { matchedRodPullN, matchedTapRatio, matchedTapScatter, matchedTensionNPerM } from '../helpers/matched-drum'
import { makeTour, type TourFixture } from '../helpers/tour-fixture'

/** The fixture's Tom 12: 12×8 in, 10 mil on both sides, heads matched. D3 over A4 = 440 Hz (ISO 16:1975). */
const noteHz = 440 * 2 ** ((50 - 69) / 12)
const tapHz = noteHz * matchedTapRatio()

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
    expect(noteHz.toFixed(1)).toBe('146.8')
    expect(shown).toContain('146.8 Hz D3')
    const bounds = `${Math.round(tapHz / matchedTapScatter())}–${Math.round(tapHz * matchedTapScatter())}`
    expect(shown.split(`tap ${tapHz.toFixed(1)} Hz ${bounds} gauge noted 75`)).toHaveLength(3)
  })

  it('shows in the notes view what the note asks of film and rods', async () => {
    const shown = await words(party.drumTech.call, `${page}?rig=${tour.rigId}&view=notes`)
    expect(shown).toContain(`film ${(matchedTensionNPerM(noteHz) / 1000).toFixed(2)} kN/m`)
    expect(shown).toContain(`each rod ${Math.round(matchedRodPullN(noteHz))} N`)
    expect(shown).toContain(`tap over note ${matchedTapRatio().toFixed(2)}`)
    expect(shown).toContain('sustain share 1.00')
    expect(shown).toContain('Why these numbers')
    expect(shown).toContain('The two taps, each with the other head damped')
    expect(shown).toContain('Film and rods.')
  })

  it('shows the gauge as noted and how to have it foretold, while no gauge goes on tour', async () => {
    for (const view of ['kit', 'notes']) {
      const shown = await words(party.viewer.call, `${page}?view=${view}`)
      expect(shown).toContain('Gauge readings are as noted. To have them foretold, choose a gauge that goes on tour')
      expect(shown).toMatch(/gauge (noted )?75\b/)
    }
  })

  it('foretells every head’s gauge by the tour’s gauge, beside the noted one, and gives a bound only outside its pairs', async () => {
    const own = await makeParty()
    const { tourId } = await makeTour(own)
    const shown = (view: 'kit' | 'notes') => words(own.viewer.call, `/tours/${tourId}/kit?view=${view}`)
    /** A gauge at the tour's side: five tunings of this very head, half a semitone apart round a tap, three divisions each. */
    const calibrated = async (name: string, middleHz: number, middle: number) => {
      const gauge = { name, scale: { min: 0, max: 100, step: 1 }, remark: '' }
      const { id } = (await own.drumTech.call('POST', '/api/gauges', { gauge })).body as { id: string }
      await own.drumTech.call('PUT', '/api/gauges/tours-gauge', { gaugeId: id })
      expect(await shown('kit')).toMatch(new RegExp(`no curve yet from ${name} \\. .+ gauge noted 75 `))
      for (const step of [-2, -1, 0, 1, 2]) {
        const head = { diameterIn: 12, depthIn: 8, plyMils: [10], film: 'coated', coatingGPerM2: 0 }
        const read = { reading: middle + 3 * step, tapHz: Number((middleHz * 2 ** (step / 24)).toFixed(2)) }
        const pair = { ...head, ...read, temperatureC: 20, remark: '' }
        expect((await own.drumTech.call('POST', `/api/gauges/${id}/pairs`, { pair })).status).toBe(201)
      }
    }
    // The note's own tap read 60 in the middle of a straight line, so 60 is what it should read (derived).
    await calibrated('Brass gauge', tapHz, 60)
    const list = await shown('kit')
    expect(list).toContain('Gauge readings are foretold by Brass gauge : 9 of 10 readings fall within the bounds.')
    const heads = [...list.matchAll(/gauge 60 ([\d.]+)–([\d.]+) , noted 75/g)]
    expect(heads).toHaveLength(2)
    for (const [, low, high] of heads) {
      expect(Number(low)).toBeLessThan(60)
      expect(Number(high)).toBeGreaterThan(60)
    }
    expect([...(await shown('notes')).matchAll(/gauge 60 [\d.]+–[\d.]+ gauge, noted 75/g)]).toHaveLength(2)

    // Calibrated an octave higher it knows one thing of this head: less than its lowest pair, which read 64.
    await calibrated('Steel gauge', 2 * tapHz, 70)
    const bound = /gauge under (6[345](?:\.5)?) , noted 75/g
    expect([...(await shown('kit')).matchAll(bound)]).toHaveLength(2)
    expect((await shown('notes')).split('Looser than any head this gauge was calibrated on')).toHaveLength(3)
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
