import { Worker } from 'node:worker_threads'
import type { PdfThreadAnswer, PdfThreadInput } from './pdf-thread'

/** Text of a pack beyond this is no pack that a person could read. */
const maxInputBytes = 4 * 1024 * 1024
/** With the mail's encoding on top this stays well under what mail services take. */
const maxOutputBytes = 12 * 1024 * 1024
const timeOutMs = 90_000
const memoryMb = 1024

/** A pack that will not become smaller by trying again. */
export class PackTooLarge extends Error {
  constructor() {
    super('The pack is too large to send as a PDF.')
    this.name = 'PackTooLarge'
  }
}

/**
 * Renders a pack in a thread of its own, with a limit on size, memory and time. Only the job process calls it.
 * Throws PackTooLarge for good; any other error may be tried again.
 */
export async function renderInThread(input: PdfThreadInput): Promise<PdfThreadAnswer> {
  if (JSON.stringify(input.pack).length > maxInputBytes) throw new PackTooLarge()
  const thread = new Worker(new URL('./pdf-thread-start.mjs', import.meta.url), {
    workerData: input,
    resourceLimits: { maxOldGenerationSizeMb: memoryMb },
  })
  let timer: NodeJS.Timeout | undefined
  try {
    const answer = await new Promise<PdfThreadAnswer>((resolve, reject) => {
      timer = setTimeout(() => reject(new Error(`the PDF took longer than ${timeOutMs / 1000} s`)), timeOutMs)
      thread.once('message', resolve)
      thread.once('error', reject)
      thread.once('exit', (code) => reject(new Error(`the PDF thread ended with code ${code} and no PDF`)))
    })
    if (answer.bytes.byteLength > maxOutputBytes) throw new PackTooLarge()
    return answer
  } finally {
    clearTimeout(timer)
    await thread.terminate()
  }
}
