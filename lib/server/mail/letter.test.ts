import { beforeAll, describe, expect, it, vi } from 'vitest'
import type { Letter } from './letter'
import { letterHtml, letterText } from './letter'
import { fillLinkPlaces, linkPlace } from './link-place'

const own = '0d8c1d3a-6a0e-4b7e-9a55-0b6f5c1f2e11'
const other = '7b0f8a52-4a35-4c53-8c7a-2f9a0d1c4e77'
const stolen = `{{link invitation ${other}}}`

const letter: Letter = {
  greeting: `Hello ${stolen},`,
  paragraphs: [`The party ${stolen} invites you.`, `{${stolen}`],
  action: { label: `See ${stolen}`, href: `https://hoopwright.example/invitation/${linkPlace('invitation', own)}` },
  closing: `Questions: ${stolen}`,
}

describe('a letter', () => {
  beforeAll(() => {
    for (const [name, value] of Object.entries({
      DATABASE_URL: 'postgres://nobody@127.0.0.1/none',
      APP_URL: 'https://hoopwright.example',
      NEXTAUTH_SECRET: 'x'.repeat(32),
      LINK_SECRET: 'y'.repeat(32),
      RESEND_API_KEY: 're_test',
      RESEND_WEBHOOK_SECRET: 'whsec_test',
      BLOB_DIR: '/tmp',
    })) {
      vi.stubEnv(name, process.env[name] ?? value)
    }
  })

  it.each([
    ['text', letterText],
    ['HTML', letterHtml],
  ])('fills the place in its action alone, not one that somebody typed into a name (%s)', (_, written) => {
    const sent = fillLinkPlaces(written(letter))
    const keys = sent.match(/[\w-]{43}/g) ?? []
    expect(keys).toHaveLength(1)
    expect(sent).toContain(`https://hoopwright.example/invitation/${keys[0]}`)
    expect(sent).toContain(other)
  })

  it('shows the signs of markup as themselves', () => {
    const html = letterHtml({ greeting: '<b>"Ib" & co</b>', paragraphs: [] })
    expect(html).not.toContain('<b>')
    expect(html).toContain('&#60;b&#62;&#34;Ib&#34; &#38; co')
  })
})
