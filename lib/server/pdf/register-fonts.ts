import { Font } from '@react-pdf/renderer'
import { fileURLToPath } from 'node:url'
import { pdfFaces, pdfStacks } from '@/fonts/pdf-faces'

const folder = fileURLToPath(new URL('../../../fonts/', import.meta.url))
let loading: Promise<void> | undefined

/**
 * Registers and loads the shipped faces once. Drawn words are laid out without being asked for first, so every face is
 * loaded before anything is rendered. Words are never broken in the middle.
 */
export function registerFonts(): Promise<void> {
  loading ??= (async () => {
    for (const { family, file, weight, style } of pdfFaces) {
      Font.register({ family, src: `${folder}${file}`, fontWeight: weight, fontStyle: style })
    }
    Font.registerHyphenationCallback((word) => [word])
    await Promise.all(
      pdfFaces.map(({ family, weight, style }) =>
        Font.load({ fontFamily: family, fontWeight: weight, fontStyle: style }),
      ),
    )
  })()
  return loading
}

/** The stacks as the PDF writer takes them: the first family that has a character draws it. */
export const families = {
  name: [...pdfStacks.name],
  text: [...pdfStacks.text],
  figures: [...pdfStacks.figures],
}
