import { readFileSync } from 'node:fs'
import { expect, it } from 'vitest'
import { ink } from './ink'

const css = readFileSync(new URL('../../../app/globals.css', import.meta.url), 'utf8')

it.each(Object.entries(ink).filter(([name]) => name !== 'sheet' && name !== 'spike'))(
  'prints %s as the paper theme shows it',
  (name, colour) => {
    expect(new RegExp(`--(?:color-)?${name}:\\s*([^;]+);`).exec(css)?.[1]?.trim()).toBe(colour)
  },
)

it('prints spike as the darker spike of text, on white paper', () => {
  expect(/--(?:color-)?spike-text:\s*([^;]+);/.exec(css)?.[1]?.trim()).toBe(ink.spike)
  expect(ink.sheet).toBe('#ffffff')
})

it('keeps words readable on paper without colour: 4.5:1 or more', () => {
  const luminance = (hex: string) => {
    const [r = 0, g = 0, b = 0] = [1, 3, 5].map((at) => {
      const share = parseInt(hex.slice(at, at + 2), 16) / 255
      return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4
    })
    return 0.2126 * r + 0.7152 * g + 0.0722 * b
  }
  for (const name of ['ink', 'soft', 'spike', 'brass', 'reed', 'plum'] as const) {
    expect(1.05 / (luminance(ink[name]) + 0.05), name).toBeGreaterThanOrEqual(4.5)
  }
})
