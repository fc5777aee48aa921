import { liveHub } from './hub'

/**
 * Server-sent events of one party, only the topics that `wants` lets through. A comment every 20 s keeps proxies from
 * closing it and shows the server a client that has gone. `stillAllowed` is asked at each beat: a signed-out device or a
 * withdrawn link stops hearing within that time.
 */
export async function eventStream(input: {
  partyId: string
  signal: AbortSignal
  wants: (topic: string) => boolean
  stillAllowed: () => Promise<boolean>
}): Promise<Response> {
  const encoder = new TextEncoder()
  let left = false
  let stop = () => {
    left = true
  }
  const stream = new ReadableStream<Uint8Array>({
    async start(controller) {
      let closed = false
      const send = (text: string) => {
        if (closed) return
        // A reader that left at this very moment: nobody is there to be told, and others still are.
        if (controller.desiredSize === null || input.signal.aborted) stop()
        else controller.enqueue(encoder.encode(text))
      }
      const unsubscribe = await liveHub.subscribe(input.partyId, (topics) => {
        const heard = topics.filter((topic) => topic === 'resync' || input.wants(topic))
        if (heard.length > 0) send(`data: ${JSON.stringify(heard)}\n\n`)
      })
      const beat = setInterval(() => {
        send(': here\n\n')
        input.stillAllowed().then(
          (allowed) => {
            if (!allowed) stop()
          },
          () => stop(),
        )
      }, 20_000)
      stop = () => {
        if (closed) return
        closed = true
        clearInterval(beat)
        unsubscribe()
        try {
          controller.close()
        } catch {
          // Cancelled by its reader, and closed by that.
        }
      }
      input.signal.addEventListener('abort', stop)
      // It may have left while the subscription was made; no event tells of that any more.
      if (input.signal.aborted || left) stop()
      send('retry: 2000\ndata: ["ready"]\n\n')
    },
    cancel() {
      stop()
    },
  })
  return new Response(stream, {
    headers: { 'Content-Type': 'text/event-stream', 'Cache-Control': 'no-store', 'X-Accel-Buffering': 'no' },
  })
}
