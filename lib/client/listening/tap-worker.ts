import type { TapOrder } from './tap-session'
import { TapSession } from './tap-session'

/** The worker: hands orders to a session and its news back. Frames come by the port from the microphone's own thread. */
const session = new TapSession()

function take(order: TapOrder): void {
  for (const news of session.take(order)) self.postMessage(news)
}

self.addEventListener('message', ({ data }: MessageEvent<TapOrder>) => {
  take(data)
  if (data.kind !== 'start' || data.port === undefined) return
  data.port.onmessage = ({ data: frames }: MessageEvent<Float32Array>) => take({ kind: 'frames', frames })
})
