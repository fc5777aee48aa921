import { renderToBuffer } from '@react-pdf/renderer'
import type { PackDocument } from '@/lib/advance/pack-document'
import { PackPdf } from './pack/pack-pdf'
import type { PackLinks } from './pack/pack-pdf'
import { registerFonts } from './register-fonts'

export type PackRendering = { bytes: Uint8Array; pages: number }

/** Renders a pack to the bytes of a PDF. Heavy: only the PDF thread calls it. */
export async function renderPack(pack: PackDocument, links: PackLinks): Promise<PackRendering> {
  await registerFonts()
  const bytes = await renderToBuffer(<PackPdf pack={pack} links={links} />)
  return { bytes, pages: countPages(bytes) }
}

/** The writer puts each page's dictionary into the file as plain text; words on the pages are packed and cannot look like one. */
function countPages(bytes: Buffer): number {
  return bytes.toString('latin1').match(/\/Type \/Page\n/g)?.length ?? 0
}
