import { SAMPLE_RATES_HZ } from '@/lib/listening/check-sound'
import type { TapOptions, TapReading, TapRefusal } from '@/lib/listening/tap-report'
import type { ListeningTrouble } from './listening-trouble'
import { listeningTroubleOf } from './listening-trouble'
import type { TapNews, TapOrder } from './tap-session'

export type ListenForTaps = {
  options?: TapOptions
  /** The microphone is open: taps are heard from now on. */
  onListening: () => void
  onTap: (reading: TapReading) => void
  onRefusal: (refusal: TapRefusal) => void
  /** Loudest sample lately, 0 to 1, some twelve times a second. */
  onLevel: (peak: number) => void
  /** Aborting it ends the listening and lets go of the microphone. */
  signal: AbortSignal
}

/** How listening ended: asked to, or by trouble. */
export type ListeningEnd = { ended: 'stopped' } | { ended: 'trouble'; trouble: ListeningTrouble }

const FRAMES_MODULE = '/tap-frames.js'
/** A browser that will not start its sound within this does not hear the press as one, ms. */
const WAKE_MS = 2000

/**
 * Listens to the microphone until the signal is aborted or trouble comes. The sound goes from the browser's sound thread straight to a worker;
 * the page's own thread only gets the news. Everything that was opened is closed in the end, whichever way it ends.
 * Must be called from a press, or the browser keeps the sound asleep.
 */
export async function listenForTaps(listen: ListenForTaps): Promise<ListeningEnd> {
  const opened = new AbortController()
  const close = (what: () => void) => opened.signal.addEventListener('abort', what)
  try {
    return await run(listen, close)
  } catch (error) {
    return listen.signal.aborted ? { ended: 'stopped' } : { ended: 'trouble', trouble: listeningTroubleOf(error) }
  } finally {
    opened.abort()
  }
}

async function run(listen: ListenForTaps, close: (what: () => void) => void): Promise<ListeningEnd> {
  const { signal } = listen
  if (navigator.mediaDevices === undefined || typeof AudioWorkletNode === 'undefined') return trouble('unsupported')
  // Opened before anything is awaited: the press that allows it must still count.
  const context = openContext()
  close(() => void context.close())
  const stream = await navigator.mediaDevices.getUserMedia({
    audio: { echoCancellation: false, noiseSuppression: false, autoGainControl: false, channelCount: 1 },
  })
  close(() => stream.getTracks().forEach((track) => track.stop()))
  if (signal.aborted) return { ended: 'stopped' }
  await context.audioWorklet.addModule(FRAMES_MODULE)
  if (!(await isAwake(context))) return trouble('asleep')

  const worker = new Worker(new URL('./tap-worker.ts', import.meta.url), { type: 'module' })
  close(() => worker.terminate())
  const order = (what: TapOrder, transfer: Transferable[] = []) => worker.postMessage(what, transfer)
  const { port1, port2 } = new MessageChannel()
  const frames = new AudioWorkletNode(context, 'tap-frames', {
    numberOfInputs: 1,
    channelCount: 1,
    channelCountMode: 'explicit',
  })
  const silence = new GainNode(context, { gain: 0 })
  const source = context.createMediaStreamSource(stream)
  frames.port.postMessage(port1, [port1])
  order({ kind: 'start', sampleRateHz: context.sampleRate, options: listen.options ?? {}, port: port2 }, [port2])
  // A node that leads nowhere is not run.
  source.connect(frames).connect(silence).connect(context.destination)

  return new Promise<ListeningEnd>((resolve) => {
    const stop = () => resolve({ ended: 'stopped' })
    if (signal.aborted) return stop()
    signal.addEventListener('abort', stop, { once: true })
    close(() => signal.removeEventListener('abort', stop))
    stream.getTracks().forEach((track) => track.addEventListener('ended', () => resolve(trouble('lost'))))
    context.addEventListener('statechange', () => {
      if (!isRunning(context)) resolve(trouble('asleep'))
    })
    worker.addEventListener('error', () => resolve(trouble('broken')))
    worker.addEventListener('message', ({ data }: MessageEvent<TapNews>) => {
      if (data.kind === 'fault') resolve(trouble('broken'))
      else if (data.kind === 'level') listen.onLevel(data.peak)
      else if (data.heard.report.outcome === 'heard') listen.onTap(data.heard.report)
      else listen.onRefusal(data.heard.report)
    })
    listen.onListening()
  })
}

function openContext(): AudioContext {
  const context = new AudioContext({ latencyHint: 'interactive' })
  if (SAMPLE_RATES_HZ.some((rate) => rate === context.sampleRate)) return context
  void context.close()
  return new AudioContext({ latencyHint: 'interactive', sampleRate: SAMPLE_RATES_HZ[1] })
}

async function isAwake(context: AudioContext): Promise<boolean> {
  if (isRunning(context)) return true
  // Without a press `resume` neither succeeds nor fails.
  await Promise.race([context.resume(), new Promise((resolve) => setTimeout(resolve, WAKE_MS))])
  return isRunning(context)
}

function isRunning({ state }: AudioContext): boolean {
  return state === 'running'
}

function trouble(what: ListeningTrouble): ListeningEnd {
  return { ended: 'trouble', trouble: what }
}
