import { readFileSync, readdirSync } from 'node:fs'
import { createRequire } from 'node:module'
import { fileURLToPath } from 'node:url'
import { describe, expect, it } from 'vitest'
import { pdfFaces, pdfStacks } from './pdf-faces'
import { printableCharacters } from './printable-characters'

const folder = fileURLToPath(new URL('.', import.meta.url))
// fontkit is what the PDF writer itself reads fonts with; it ships no types.
const fontkit = createRequire(import.meta.url)('fontkit') as {
  openSync(path: string): { characterSet: number[] }
}

const drawn = (file: string) => new Set(fontkit.openSync(folder + file).characterSet)
const missing = (has: (code: number) => boolean) =>
  printableCharacters.filter((character) => !has(character.codePointAt(0)!))

interface PageFace {
  family: string
  file: string
  ranges: [number, number][]
  codes: Set<number>
}

/** The page's faces as its style sheet declares them, with the range each is limited to. */
function pageFaces(): PageFace[] {
  const css = readFileSync(new URL('../app/globals.css', import.meta.url), 'utf8')
  return [...css.matchAll(/@font-face\s*{([^}]*)}/g)].map(([, body = '']) => {
    const value = (pattern: RegExp) => pattern.exec(body)?.[1] ?? ''
    const file = value(/fonts\/([^']+)'/)
    const ranges = value(/unicode-range:\s*([^;]+);/)
      .split(',')
      .map((range): [number, number] => {
        const [from = '', to = from] = range.trim().replace('U+', '').split('-')
        return [parseInt(from, 16), parseInt(to, 16)]
      })
    return { family: value(/font-family:\s*'([^']+)'/), file, ranges, codes: drawn(file) }
  })
}

function pageStack(variable: string): string[] {
  const css = readFileSync(new URL('../app/globals.css', import.meta.url), 'utf8')
  const stack = new RegExp(`${variable}:\\s*([^;]+);`).exec(css)?.[1] ?? ''
  return [...stack.matchAll(/'([^']+)'/g)].map(([, family = '']) => family)
}

describe('every printable character has a shape of ours', () => {
  const faces = pageFaces()

  it.each(['--font-name', '--font-text', '--font-figures'])('on the page, in %s', (variable) => {
    const families = pageStack(variable)
    const stack = faces.filter((face) => families.includes(face.family))
    expect(stack.length).toBeGreaterThan(2)
    expect(
      missing((code) =>
        stack.some((face) => face.codes.has(code) && face.ranges.some(([from, to]) => code >= from && code <= to)),
      ),
    ).toEqual([])
  })

  it.each(Object.entries(pdfStacks))('in a PDF, in the stack "%s"', (_, families) => {
    const stack = pdfFaces.filter((face) => (families as readonly string[]).includes(face.family))
    const regular = stack.filter((face) => face.style === 'normal').map((face) => drawn(face.file))
    expect(missing((code) => regular.some((codes) => codes.has(code)))).toEqual([])
  })

  it('in every weight and slant of the PDF text alike', () => {
    for (const [family, count] of [
      ['Text', 3],
      ['Text Extended', 3],
      ['Figures', 2],
      ['Figures Extended', 2],
    ] as const) {
      const sets = pdfFaces.filter((face) => face.family === family).map((face) => [...drawn(face.file)].sort())
      expect(sets).toHaveLength(count)
      for (const set of sets) expect(set).toEqual(sets[0])
    }
  })
})

it('ships no font file that neither the page nor a PDF uses', () => {
  const used = new Set([...pageFaces().map((face) => face.file), ...pdfFaces.map((face) => face.file)])
  const shipped = readdirSync(folder).filter((name) => /\.woff2?$/.test(name))
  expect(shipped.sort()).toEqual([...used].sort())
})
