import type { TapRefusalKind } from './tap-report'

const REFUSALS: Record<TapRefusalKind, string> = {
  silent: 'Nothing heard. Tap nearer to the microphone.',
  clipped: 'Not sure, tap again: too loud for the microphone. Tap softer or move it away.',
  'too-short': 'Not sure, tap again: the ring was cut off. Let it sound for a second.',
  'double-hit': 'Not sure, tap again: two hits came together.',
  'not-a-tap': 'Not sure, tap again: that did not sound like a drum head.',
  'too-noisy': 'Not sure, tap again: too much noise around. Tap nearer to the microphone.',
  unclear: 'Not sure, tap again: no one pitch stands out. Tap near a lug with a fingertip on the centre.',
}

/** Why no pitch is named, as one plain sentence or two to the person who tapped. */
export function tapRefusalWords(kind: TapRefusalKind): string {
  return REFUSALS[kind]
}

/** The same to the person who struck the drum's note. */
export function noteRefusalWords(kind: TapRefusalKind): string {
  return kind === 'unclear'
    ? 'Not sure, strike again: no one pitch stands out. Strike the centre with both heads free.'
    : REFUSALS[kind]
}
