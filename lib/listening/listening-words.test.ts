import { expect, test } from 'vitest'
import { noteRefusalWords, tapRefusalWords } from './listening-words'
import type { TapRefusalKind } from './tap-report'

const kinds: Record<TapRefusalKind, true> = {
  silent: true,
  clipped: true,
  'too-short': true,
  'double-hit': true,
  'not-a-tap': true,
  'too-noisy': true,
  unclear: true,
}

test('every refusal has words of its own, and none shouts', () => {
  const words = (Object.keys(kinds) as TapRefusalKind[]).map(tapRefusalWords)
  expect(new Set(words).size).toBe(words.length)
  for (const said of words) expect(said).toMatch(/^[A-Z][^!]*\.$/)
})

test('two hits', () => {
  expect(tapRefusalWords('double-hit')).toBe('Not sure, tap again: two hits came together.')
})

test('a note without one pitch asks for the centre, never for a lug', () => {
  expect(noteRefusalWords('unclear')).toMatch(/the centre with both heads free/)
  expect(noteRefusalWords('unclear')).not.toMatch(/lug/)
  expect(noteRefusalWords('clipped')).toBe(tapRefusalWords('clipped'))
})
