import { Worker } from 'node:worker_threads'
import type { PdfThreadAnswer, PdfThreadInput } from './pdf-thread'

/** Text of a pack beyond this is no pack that a person could read. */
const maxInputBytes = 4 * 1024 * 1024
/** With the mail's encoding on top this stays well under what mail services take. */
const maxOutputBytes = 12 * 1024 * 1024
const timeOutMs = 90_000
const memoryMb = 1024
/** Starting a thread costs several times what a pack does: few are started, and they are kept for the next pack. */
const maxThreads = 2
const idle: Worker[] = []
const waiting: (() => void)[] = []
let atWork = 0

async function takeTurn(): Promise<void> {
  if (atWork < maxThreads) atWork += 1
  else await new Promise<void>((go) => waiting.push(go))
}

/** Hands the turn to whoever has waited longest. */
function endTurn(): void {
  const next = waiting.shift()
  if (next) next()
  else atWork -= 1
}

/** A pack that will not become smaller by trying again. */
export class PackTooLarge extends Error {
  constructor() {
    super('The pack is too large to send as a PDF.')
    this.name = 'PackTooLarge'
  }
}

function startThread(): Worker {
  return new Worker(new URL('./pdf-thread-start.mjs', import.meta.url), {
    resourceLimits: { maxOldGenerationSizeMb: memoryMb },
  })
}

/** An idle thread does not keep its process from ending. */
function release(thread: Worker): void {
  thread.removeAllListeners()
  thread.unref()
  // One that ends by itself while nobody uses it is not handed out again.
  thread.once('error', () => undefined)
  thread.once('exit', () => {
    const at = idle.indexOf(thread)
    if (at !== -1) idle.splice(at, 1)
  })
  idle.push(thread)
}

/**
 * Renders a pack in a thread of its own, with a limit on size, memory and time. Only the job process calls it.
 * Throws PackTooLarge for good; any other error may be tried again. A thread that failed is not used again.
 */
export async function renderInThread(input: PdfThreadInput): Promise<PdfThreadAnswer> {
  if (JSON.stringify(input.pack).length > maxInputBytes) throw new PackTooLarge()
  await takeTurn()
  try {
    const thread = idle.pop() ?? startThread()
    thread.removeAllListeners()
    thread.ref()
    const answer = await answerOf(thread, input).catch(async (error: unknown) => {
      await thread.terminate()
      throw error
    })
    release(thread)
    if (answer.bytes.byteLength > maxOutputBytes) throw new PackTooLarge()
    return answer
  } finally {
    endTurn()
  }
}

function answerOf(thread: Worker, input: PdfThreadInput): Promise<PdfThreadAnswer> {
  return new Promise<PdfThreadAnswer>((resolve, reject) => {
    const timer = setTimeout(() => reject(new Error(`the PDF took longer than ${timeOutMs / 1000} s`)), timeOutMs)
    const settle = (how: () => void) => {
      clearTimeout(timer)
      how()
    }
    thread.once('message', (answer: PdfThreadAnswer) => settle(() => resolve(answer)))
    thread.once('error', (error) => settle(() => reject(error)))
    thread.once('exit', (code) => settle(() => reject(new Error(`the PDF thread ended with code ${code} and no PDF`))))
    thread.postMessage(input)
  })
}
