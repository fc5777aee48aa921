import { parentPort, workerData } from 'node:worker_threads'
import type { PackDocument } from '@/lib/advance/pack-document'
import type { PackLinks } from './pack/pack-pdf'
import { renderPack } from './render-pack'

export type PdfThreadInput = { pack: PackDocument; links: PackLinks }
export type PdfThreadAnswer = { bytes: Uint8Array; pages: number }

/** The thread that renders one pack and ends. Laying out pages takes a second or more and would hold up everything else. */
const { pack, links } = workerData as PdfThreadInput
const answer: PdfThreadAnswer = await renderPack(pack, links)
parentPort?.postMessage(answer)
