import { describe, expect, it } from 'vitest'
import { z } from 'zod'
import { AppError } from '@/lib/errors'
import { parseInput } from './parse-input'

const schema = z.object({ name: z.string(), pieces: z.array(z.looseObject({ label: z.string() })) })
const nested = (depth: number): unknown => (depth === 0 ? 'end' : [nested(depth - 1)])
const parse = (value: unknown) => () => parseInput(schema, value)
const fieldsOf = (run: () => unknown) => {
  try {
    run()
  } catch (error) {
    if (error instanceof AppError && error.code === 'invalid') return error.details?.['fields']
    throw error
  }
  throw new Error('it was taken')
}

describe('parseInput', () => {
  it('takes any text that can be stored', () => {
    const value = { name: 'Žofín 🥁\n\tline', pieces: [{ label: '', newer: nested(8) }] }
    expect(parse(value)()).toEqual(value)
  })

  it.each([
    ['a null character', { name: 'a\u0000b', pieces: [] }, 'name'],
    ['half of a pair', { name: '\ud83e', pieces: [] }, 'name'],
    ['a null character in what a newer release adds', { name: 'a', pieces: [{ label: 'b', newer: { x: '\u0000' } }] }, 'pieces.0.newer.x'],
    ['a null character in a key', { name: 'a', pieces: [{ label: 'b', '\u0000': 1 }] }, 'pieces.0'],
  ])('refuses %s, which no column holds, and names the field', (_, value, field) => {
    expect(fieldsOf(parse(value))).toEqual({ [field]: 'holds a character that is none' })
  })

  it('refuses nesting that would not come back out of the database', () => {
    const fields = fieldsOf(parse({ name: 'a', pieces: [{ label: 'b', newer: nested(5000) }] }))
    expect(Object.values(fields as object)).toEqual(['is nested too deeply'])
  })

  it('names every field at fault', () => {
    expect(Object.keys(fieldsOf(parse({ pieces: [{}] })) as object)).toEqual(['name', 'pieces.0.label'])
  })
})
