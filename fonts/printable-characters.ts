const span = (from: number, to: number) =>
  Array.from({ length: to - from + 1 }, (_, i) => String.fromCodePoint(from + i))

/** Signs of the trade and of punctuation that the product prints beside letters and digits. */
const signs = '♯♭♮Δ≤≥→←↑↓Ω±×÷≠°µ·•–—−’‘“”…½¼¾²³∓√θβσπνρελμχγωκφΣ′∞≈€'

/**
 * Every character the product can print on a page or in a PDF: ASCII, Latin-1, Latin Extended-A and the signs above.
 * The soft hyphen (U+00AD) is left out: it is an instruction to break a word, not a character with a shape.
 */
export const printableCharacters: readonly string[] = [
  ...new Set([
    ...span(0x20, 0x7e),
    ...span(0xa0, 0xff).filter((character) => character !== '\u00ad'),
    ...span(0x100, 0x17f),
    ...signs,
  ]),
]
