import { describe, expect, it } from 'vitest'
import { composePack } from '@/lib/advance/pack'
import { sampleHire, sampleRevision, sampleShow } from '@/lib/advance/sample-revision'
import { readPdf } from '../../../tests/helpers/read-pdf'
import { PackTooLarge, renderInThread } from './render-in-thread'

const pack = composePack({
  revision: { number: 3, issuedAt: '2031-09-20T10:00:00.000Z', note: 'First.', document: sampleRevision() },
  recipient: { kind: 'supplier', locale: 'en', hire: sampleHire, shows: [sampleShow] },
  contacts: [],
  previous: null,
})
const links = { reply: 'https://hoopwright.example/r/key', bench: null }

describe('a pack rendered in a thread of its own', () => {
  it('comes back as the bytes of a PDF, while this thread goes on', async () => {
    let beats = 0
    const timer = setInterval(() => (beats += 1), 10)
    const { bytes, pages } = await renderInThread({ pack, links })
    clearInterval(timer)
    const file = await readPdf(bytes)
    expect(file.pages).toHaveLength(pages)
    expect(file.links).toEqual([links.reply])
    expect(beats).toBeGreaterThan(10)
  }, 30_000)

  it('is refused for good when it is larger than any reader could want', async () => {
    const note = 'x'.repeat(5 * 1024 * 1024)
    await expect(
      renderInThread({ pack: { ...pack, revision: { ...pack.revision, note } }, links }),
    ).rejects.toBeInstanceOf(PackTooLarge)
  })

  it('tells what went wrong in the thread', async () => {
    const broken = { ...pack, lines: [{ ...pack.lines[0], details: null }] } as unknown as typeof pack
    await expect(renderInThread({ pack: broken, links })).rejects.toThrow(/map|null/)
  }, 30_000)

  it('goes on after one that failed, and prints several at once without mixing them up', async () => {
    const named = (name: string) => ({ pack, links: { ...links, reply: `https://hoopwright.example/r/${name}` } })
    const names = ['one', 'two', 'three', 'four']
    const printed = await Promise.all(names.map((name) => renderInThread(named(name))))
    const again = await renderInThread(named('five'))
    const files = await Promise.all([...printed, again].map(({ bytes }) => readPdf(bytes)))
    expect(files.map((file) => file.links)).toEqual(
      [...names, 'five'].map((name) => [`https://hoopwright.example/r/${name}`]),
    )
  }, 60_000)
})
