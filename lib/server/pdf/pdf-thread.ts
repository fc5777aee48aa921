import { parentPort } from 'node:worker_threads'
import type { PackDocument } from '@/lib/advance/pack-document'
import type { PackLinks } from './pack/pack-pdf'
import { renderPack } from './render-pack'

export type PdfThreadInput = { pack: PackDocument; links: PackLinks }
export type PdfThreadAnswer = { bytes: Uint8Array; pages: number }

/** The thread that renders packs, one after the other. Laying out pages takes up to a second and would hold up everything else. */
parentPort?.on('message', ({ pack, links }: PdfThreadInput) => {
  // A pack that cannot be rendered ends the thread: whoever waits for it is told, and no half-made state is left for the next.
  void renderPack(pack, links).then((answer: PdfThreadAnswer) => parentPort?.postMessage(answer))
})
