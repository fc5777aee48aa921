/**
 * Listens to a stream of topics and calls back with each batch; the browser reconnects by itself and the server says
 * `resync` when it may have missed something. Returns the way to stop.
 */
export function listenLive(url: string, heard: (topics: string[]) => void): () => void {
  const source = new EventSource(url)
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
