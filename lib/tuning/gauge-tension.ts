import { AcousticsError } from '@/lib/acoustics/acoustics-error'
import { ROOM_TEMPERATURE_C } from '@/lib/acoustics/air'
import { lugTapHz, lugTapTensionNPerM } from '@/lib/acoustics/lug-tap'
import { openAirDensityKgPerM2 } from '@/lib/acoustics/open-air-head'
import { METRE_PER_INCH } from '@/lib/acoustics/require-quantity'
import { loadedHeadKgPerM2 } from '@/lib/acoustics/two-head-drum'
import { filmOf } from './drum-estimate'
import { GaugeError } from './gauge-error'
import { requireFigure, requireGaugeHead } from './gauge-profile'
import type { GaugeHead } from './gauge-profile'

/** Under this no head holds a note, over it no drum film holds at all: a tap that says otherwise was typed in another unit. */
const LEAST_TENSION_N_PER_M = 60
const MOST_TENSION_N_PER_M = 15_000

/** A temperature nobody wrote down is the room's. */
const temperatureOf = (temperatureC: number | null) =>
  temperatureC === null ? ROOM_TEMPERATURE_C : requireFigure('temperatureC', temperatureC, -30, 60, '°C')

/** What moves in a tap with the other head damped, and the radius it moves within. */
function tappedHead(head: GaugeHead, temperatureC: number | null) {
  requireGaugeHead(head)
  const diameterM = head.diameterIn * METRE_PER_INCH
  const shell = { diameterM, depthM: head.depthIn * METRE_PER_INCH, temperatureC: temperatureOf(temperatureC) }
  const film = filmOf(head)
  const massKgPerM2 = head.openShell
    ? openAirDensityKgPerM2(1, { ...film, ...shell })
    : loadedHeadKgPerM2(1, film, shell)
  return { massKgPerM2, radiusM: diameterM / 2 }
}

/**
 * Film tension, N/m, of a head whose tap near a lug sounds at `tapHz` with the other head damped: shape (1,1) on a closed shell,
 * or in the open air on an open one, as in `drumModel`.
 * @throws GaugeError `quantity`: a figure out of range, or a tap that no film on this drum can sound
 */
export function tensionOfTapNPerM(head: GaugeHead, tapHz: number, temperatureC: number | null): number {
  const { massKgPerM2, radiusM } = tappedHead(head, temperatureC)
  requireFigure('tapHz', tapHz, 20, 2000, 'Hz')
  const tensionNPerM = lugTapTensionNPerM(tapHz, massKgPerM2, radiusM)
  if (tensionNPerM < LEAST_TENSION_N_PER_M || tensionNPerM > MOST_TENSION_N_PER_M)
    throw new GaugeError(
      'quantity',
      'tapHz',
      `A tap of ${tapHz} Hz on this head needs a film tension of ${Math.round(tensionNPerM)} N/m; drum heads hold ${LEAST_TENSION_N_PER_M} to ${MOST_TENSION_N_PER_M}. Look at the size, the plies and the pitch again.`,
    )
  return tensionNPerM
}

/**
 * Pitch in Hz of a tap near a lug of a head at a film tension, the other head damped: the inverse of `tensionOfTapNPerM`.
 * @throws GaugeError `quantity`
 */
export function tapOfTensionHz(head: GaugeHead, tensionNPerM: number, temperatureC: number | null): number {
  const { massKgPerM2, radiusM } = tappedHead(head, temperatureC)
  try {
    return lugTapHz(tensionNPerM, massKgPerM2, radiusM)
  } catch (error) {
    if (error instanceof AcousticsError) throw new GaugeError('quantity', error.field, error.message)
    throw error
  }
}
