import { describe, expect, it } from 'vitest'
import { dateSchema, versionSchema } from './common'

describe('dateSchema', () => {
  it.each(['2000-01-01', '2031-02-28', '2199-12-31'])('takes %s', (date) => {
    expect(dateSchema.parse(date)).toBe(date)
  })

  it.each(['0000-01-01', '1999-12-31', '2200-01-01', '9999-12-31', '2031-02-29', '31-10-14'])('refuses %s', (date) => {
    expect(dateSchema.safeParse(date).success).toBe(false)
  })
})

describe('versionSchema', () => {
  it('takes what the column holds and no more', () => {
    expect(versionSchema.safeParse(2 ** 31 - 1).success).toBe(true)
    expect(versionSchema.safeParse(2 ** 31).success).toBe(false)
    expect(versionSchema.safeParse(0).success).toBe(false)
    expect(versionSchema.safeParse(Infinity).success).toBe(false)
  })
})
