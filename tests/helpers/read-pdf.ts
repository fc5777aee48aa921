import { getDocument, OPS } from 'pdfjs-dist/legacy/build/pdf.mjs'

type Matrix = [number, number, number, number, number, number]
export type PdfBox = { widthMm: number; heightMm: number; dashed: boolean; points: number }
export type PdfPage = {
  widthMm: number
  heightMm: number
  text: string
  /** Straight-sided shapes drawn on the page, their size as printed. */
  boxes: PdfBox[]
}
export type PdfFile = { pages: PdfPage[]; fonts: string[]; links: string[] }

const millimetres = (points: number) => (points * 25.4) / 72

function times(m: Matrix, n: Matrix): Matrix {
  return [
    m[0] * n[0] + m[2] * n[1],
    m[1] * n[0] + m[3] * n[1],
    m[0] * n[2] + m[2] * n[3],
    m[1] * n[2] + m[3] * n[3],
    m[0] * n[4] + m[2] * n[5] + m[4],
    m[1] * n[4] + m[3] * n[5] + m[5],
  ]
}

/** A PDF as an independent reader sees it: its words, its fonts, its links and the size of what is drawn. */
export async function readPdf(bytes: Uint8Array): Promise<PdfFile> {
  const file = await getDocument({ data: new Uint8Array(bytes), useSystemFonts: false, verbosity: 0 }).promise
  const pages: PdfPage[] = []
  const fonts = new Set<string>()
  const links = new Set<string>()
  for (let number = 1; number <= file.numPages; number++) {
    const page = await file.getPage(number)
    const [left = 0, bottom = 0, right = 0, top = 0] = page.view
    const content = await page.getTextContent({ disableNormalization: true })
    const operators = await page.getOperatorList()
    operators.fnArray.forEach((fn, index) => {
      if (fn !== OPS.setFont) return
      const id = (operators.argsArray[index] as [string])[0]
      fonts.add((page.commonObjs.get(id) as { name: string }).name)
    })
    for (const note of (await page.getAnnotations()) as { url?: string }[]) if (note.url) links.add(note.url)
    pages.push({
      widthMm: millimetres(right - left),
      heightMm: millimetres(top - bottom),
      text: content.items.map((item) => ('str' in item ? item.str + (item.hasEOL ? '\n' : '') : '')).join(''),
      boxes: boxesOf(operators),
    })
  }
  await file.destroy()
  return { pages, fonts: [...fonts], links: [...links] }
}

function boxesOf(operators: { fnArray: number[]; argsArray: unknown[] }): PdfBox[] {
  const boxes: PdfBox[] = []
  const kept: { matrix: Matrix; dashed: boolean }[] = []
  let state: { matrix: Matrix; dashed: boolean } = { matrix: [1, 0, 0, 1, 0, 0], dashed: false }
  operators.fnArray.forEach((fn, index) => {
    const args = operators.argsArray[index] as unknown[]
    if (fn === OPS.save) kept.push({ ...state })
    if (fn === OPS.restore) state = kept.pop() ?? state
    if (fn === OPS.transform) state = { ...state, matrix: times(state.matrix, args as Matrix) }
    if (fn === OPS.setDash) state = { ...state, dashed: (args[0] as number[]).length > 0 }
    if (fn !== OPS.constructPath) return
    const [steps, coordinates] = args as [number[], number[]]
    if (!steps.every((step) => step === OPS.moveTo || step === OPS.lineTo || step === OPS.closePath)) return
    const places: [number, number][] = []
    for (let at = 0; at + 1 < coordinates.length; at += 2) {
      const [x = 0, y = 0] = coordinates.slice(at, at + 2)
      const [a, b, c, d, e, f] = state.matrix
      places.push([a * x + c * y + e, b * x + d * y + f])
    }
    const span = (axis: 0 | 1) =>
      Math.max(...places.map((place) => place[axis])) - Math.min(...places.map((place) => place[axis]))
    boxes.push({
      widthMm: millimetres(span(0)),
      heightMm: millimetres(span(1)),
      dashed: state.dashed,
      points: places.length,
    })
  })
  return boxes
}
