/**
 * Listens to a stream of topics and calls back with each batch; the browser reconnects by itself and the server says
 * `resync` when it may have missed something. Returns the way to stop.
 * @param refused called when the server refused the stream, so that the browser will not try again by itself
 */
export function listenLive(url: string, heard: (topics: string[]) => void, refused?: () => void): () => void {
  const source = new EventSource(url)
  source.onerror = () => {
    if (source.readyState === EventSource.CLOSED) refused?.()
  }
  let opened = false
  source.onmessage = (event: MessageEvent<string>) => {
    const topics = JSON.parse(event.data) as string[]
    // The first `ready` is the beginning; a later one follows a lost connection.
    if (topics[0] === 'ready') {
      if (opened) heard(['resync'])
      opened = true
      return
    }
    heard(topics)
  }
  return () => source.close()
}
