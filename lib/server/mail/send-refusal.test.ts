import { describe, expect, it } from 'vitest'
import { readRefusal } from './send-refusal'

describe('readRefusal', () => {
  it.each([
    ['no connection', { name: 'application_error', statusCode: null, message: 'Unable to fetch data.' }],
    ['an answer without a body that can be read', null],
    ['a gateway’s own JSON', { message: 'upstream timed out' }],
    ['too many', { name: 'rate_limit_exceeded', statusCode: 429, message: 'slow down' }],
    ['the day’s quota', { name: 'daily_quota_exceeded', statusCode: 429, message: 'tomorrow' }],
    ['a fault over there', { name: 'internal_server_error', statusCode: 500, message: 'sorry' }],
    ['a gateway', { name: 'application_error', statusCode: 502, message: 'bad gateway' }],
    ['the same key still in work', { name: 'concurrent_idempotent_requests', statusCode: 409, message: 'wait' }],
    ['a wrong key of ours', { name: 'invalid_api_key', statusCode: 403, message: 'key' }],
  ])('tries again after %s', (_, error) => {
    expect(readRefusal(error).passing).toBe(true)
  })

  it.each([
    ['a bad address', { name: 'validation_error', statusCode: 422, message: 'Invalid `to` field.' }],
    ['a missing field', { name: 'missing_required_field', statusCode: 422, message: 'Missing `subject`.' }],
    ['too large', { name: 'validation_error', statusCode: 413, message: 'At most 40 MB.' }],
    ['a bad request', { name: 'validation_error', statusCode: 400, message: 'no' }],
  ])('gives up after %s and keeps the reason', (_, error) => {
    const refusal = readRefusal(error)
    expect(refusal.passing).toBe(false)
    expect(refusal.words).toContain(error.message)
  })

  it('leaves it to a person when an earlier try was taken with another body', () => {
    const refusal = readRefusal({ name: 'invalid_idempotent_request', statusCode: 409, message: 'used' })
    expect(refusal).toMatchObject({ passing: false, words: expect.stringContaining('Ask the reader') })
  })
})
