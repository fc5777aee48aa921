import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { tokens } from './tokens'
import type { ColourToken, Theme } from './tokens'

/** Relative luminance, WCAG 2.2 (https://www.w3.org/TR/WCAG22/#dfn-relative-luminance). */
function luminance(hex: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5]
    .map((at) => parseInt(hex.slice(at, at + 2), 16) / 255)
    .map((c) => (c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4))
  return 0.2126 * r + 0.7152 * g + 0.0722 * b
}

function contrast(a: string, b: string): number {
  const [dark = 0, light = 0] = [luminance(a), luminance(b)].sort((x, y) => x - y)
  return (light + 0.05) / (dark + 0.05)
}

const themes = ['paper', 'stage'] as const satisfies Theme[]
const grounds = ['paper', 'sheet', 'wash'] as const satisfies ColourToken[]

it('measures contrast as WCAG does: black on white 21, #777777 on white 4.48', () => {
  expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 5)
  expect(contrast('#777777', '#ffffff')).toBeCloseTo(4.48, 2)
})

describe.each(themes)('on the %s theme', (theme) => {
  const colour = tokens[theme]

  it.each(['ink', 'soft', 'spike-text', 'reed', 'brass', 'plum'] as const)(
    '%s reads as text on every ground',
    (text) => {
      for (const ground of grounds) expect(contrast(colour[text], colour[ground])).toBeGreaterThanOrEqual(4.5)
    },
  )

  it.each(['ink', 'soft', 'spike', 'reed', 'brass', 'plum'] as const)(
    '%s can be seen as an edge or a control',
    (edge) => {
      for (const ground of grounds) expect(contrast(colour[edge], colour[ground])).toBeGreaterThanOrEqual(3)
    },
  )

  it('text turned round reads on ink and on reed', () => {
    for (const ground of ['ink', 'reed'] as const) {
      expect(contrast(colour.paper, colour[ground])).toBeGreaterThanOrEqual(4.5)
    }
  })
})

describe('the style sheet states the same colours', () => {
  const css = readFileSync(new URL('../../app/globals.css', import.meta.url), 'utf8')
  const stated = (opening: string) => {
    const at = css.indexOf(opening)
    expect(at, `${opening} is in globals.css`).toBeGreaterThanOrEqual(0)
    const body = css.slice(at + opening.length, css.indexOf('}', at))
    return Object.fromEntries(
      [...body.matchAll(/--color-([a-z-]+):\s*(#[0-9a-f]{6});/g)].map(([, name, hex]) => [name, hex]),
    )
  }

  it.each([
    ['@theme {', 'paper'],
    ["[data-theme='paper'] {", 'paper'],
    ["[data-theme='stage'] {", 'stage'],
    [':root:not([data-theme]) {', 'stage'],
  ] as const)('in %s', (opening, theme) => {
    expect(stated(opening)).toEqual(tokens[theme])
  })
})
