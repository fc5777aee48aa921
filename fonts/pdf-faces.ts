/** One face as a PDF registers it: a family name, a file in this folder, a weight and a slant. */
export interface PdfFace {
  readonly family: string
  readonly file: string
  readonly weight: 400 | 700
  readonly style: 'normal' | 'italic'
}

/**
 * The PDF writer takes one file per face and cannot limit a file to a range of characters, so Latin Extended and the
 * signs are families of their own and stand behind the first in each stack below.
 */
export const pdfFaces: readonly PdfFace[] = [
  { family: 'Name', file: 'bricolage-grotesque-narrow-latin.woff', weight: 700, style: 'normal' },
  { family: 'Name Extended', file: 'bricolage-grotesque-narrow-latin-ext.woff', weight: 700, style: 'normal' },
  { family: 'Text', file: 'atkinson-hyperlegible-next-latin-400-normal.woff', weight: 400, style: 'normal' },
  { family: 'Text', file: 'atkinson-hyperlegible-next-latin-700-normal.woff', weight: 700, style: 'normal' },
  { family: 'Text', file: 'atkinson-hyperlegible-next-latin-400-italic.woff', weight: 400, style: 'italic' },
  {
    family: 'Text Extended',
    file: 'atkinson-hyperlegible-next-latin-ext-400-normal.woff',
    weight: 400,
    style: 'normal',
  },
  {
    family: 'Text Extended',
    file: 'atkinson-hyperlegible-next-latin-ext-700-normal.woff',
    weight: 700,
    style: 'normal',
  },
  {
    family: 'Text Extended',
    file: 'atkinson-hyperlegible-next-latin-ext-400-italic.woff',
    weight: 400,
    style: 'italic',
  },
  { family: 'Figures', file: 'atkinson-hyperlegible-mono-latin-400-normal.woff', weight: 400, style: 'normal' },
  { family: 'Figures', file: 'atkinson-hyperlegible-mono-latin-700-normal.woff', weight: 700, style: 'normal' },
  {
    family: 'Figures Extended',
    file: 'atkinson-hyperlegible-mono-latin-ext-400-normal.woff',
    weight: 400,
    style: 'normal',
  },
  {
    family: 'Figures Extended',
    file: 'atkinson-hyperlegible-mono-latin-ext-700-normal.woff',
    weight: 700,
    style: 'normal',
  },
  { family: 'Accidentals', file: 'accidentals.woff', weight: 400, style: 'normal' },
  { family: 'Signs', file: 'noto-sans-math-signs.woff', weight: 400, style: 'normal' },
  { family: 'Latin rest', file: 'noto-sans-latin-rest.woff', weight: 400, style: 'normal' },
  { family: 'Latin-1 rest', file: 'noto-sans-latin-1-rest.woff', weight: 400, style: 'normal' },
]

const behind = ['Accidentals', 'Signs', 'Latin rest', 'Latin-1 rest'] as const

/** Family stacks for a PDF's `fontFamily`, in the order in which a missing character is looked for. */
export const pdfStacks = {
  name: ['Name', 'Name Extended', ...behind],
  text: ['Text', 'Text Extended', ...behind],
  figures: ['Figures', 'Figures Extended', ...behind],
} as const
