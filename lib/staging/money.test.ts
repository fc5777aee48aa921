import { describe, expect, it } from 'vitest'
import { formatMoney, parseMoney, typedMoney } from './money'

describe('a typed amount', () => {
  it.each([
    ['1250', 'EUR', 125_000],
    ['1250.5', 'EUR', 125_050],
    ['1 250,50', 'EUR', 125_050],
    ['0', 'EUR', 0],
    ['1250', 'JPY', 1250],
    ['1.234', 'KWD', 1234],
  ])('%s %s', (text, currency, minor) => expect(parseMoney(text, currency)).toBe(minor))

  it.each([
    ['', 'EUR'],
    ['-5', 'EUR'],
    ['1,250.50', 'EUR'],
    ['1.005', 'EUR'],
    ['12.5', 'JPY'],
    ['ten', 'EUR'],
    ['99999999999999', 'EUR'],
  ])('"%s" %s is refused', (text, currency) => expect(parseMoney(text, currency)).toBeNull())
})

it('an amount is written back with the digits of its currency', () => {
  expect(typedMoney(125_050, 'EUR')).toBe('1250.50')
  expect(typedMoney(1250, 'JPY')).toBe('1250')
  expect(formatMoney(125_050, 'EUR')).toBe('EUR 1,250.50')
  expect(formatMoney(1250, 'JPY')).toBe('JPY 1,250')
})
