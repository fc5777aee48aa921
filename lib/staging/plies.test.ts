import { describe, expect, it } from 'vitest'
import { micrometreWords, parsePlies } from './plies'

describe('typed plies', () => {
  it.each<[string, number[]]>([
    ['10', [10]],
    ['10 mil', [10]],
    ['7+7', [7, 7]],
    ['7 + 7 mil', [7, 7]],
    ['7,5 + 3', [7.5, 3]],
    // 1 mil is 25.4 µm exactly.
    ['254 µm', [10]],
    ['254+76.2 um', [10, 3]],
    ['188 μm', [7.4]],
  ])('%s', (text, plyMils) => {
    expect(parsePlies(text)).toEqual({ plyMils, problem: null })
  })

  it.each(['', 'thick', '7 +', '+ 7', '7 7', '-10', '10 mm'])('"%s" is refused with the way to write it', (text) => {
    expect(parsePlies(text)).toEqual({ plyMils: null, problem: 'write each ply in mil, such as 10 or 7 + 7' })
  })

  it('are shown in micrometres', () => {
    expect(micrometreWords([10])).toBe('254 µm')
    expect(micrometreWords([7, 7.5])).toBe('178 + 191 µm')
  })
})
