import { describe, expect, it } from 'vitest'
import { deviceWords } from './device-words'

describe('a device in words', () => {
  it.each([
    ['Mozilla/5.0 (X11; Linux x86_64) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/131.0.0.0 Safari/537.36', 'Chrome or Chromium on Linux'],
    ['Mozilla/5.0 (Linux; Android 14; Pixel) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/131.0.0.0 Mobile Safari/537.36', 'Chrome or Chromium on a phone (Android)'],
    ['Mozilla/5.0 (iPhone; CPU iPhone OS 18_1 like Mac OS X) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/18.1 Mobile/15E148 Safari/604.1', 'Safari on a phone (iOS)'],
    ['Mozilla/5.0 (Windows NT 10.0; Win64; x64) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/131.0.0.0 Safari/537.36 Edg/131.0.0.0', 'Edge on Windows'],
    ['Mozilla/5.0 (Macintosh; Intel Mac OS X 14.7; rv:133.0) Gecko/20100101 Firefox/133.0', 'Firefox on a Mac'],
  ])('%s', (userAgent, words) => {
    expect(deviceWords(userAgent)).toBe(words)
  })

  it('says so when a device does not tell', () => {
    expect(deviceWords('node')).toBe('A device that does not say what it is')
    expect(deviceWords('')).toBe('A device that does not say what it is')
  })
})
