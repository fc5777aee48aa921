const HEARTBEAT_MS = 30_000
const QUIET_MS = 1_000

const seconds = (ms) => `${(ms / 1000).toFixed(1)} s`

/**
 * Prints what is being done, with the time since the beginning in front and the step's own time behind.
 * A step that is over within a second takes one line; a longer one says that it began, and that it goes on.
 */
export function createSteps({ write = (text) => process.stdout.write(text), now = () => performance.now() } = {}) {
  const began = now()
  const line = (text) => write(`${seconds(now() - began).padStart(8)}  ${text}\n`)

  return {
    line,
    /**
     * @template T
     * @param {string} name
     * @param {(say: (text: string) => void) => Promise<T> | T} work `say` sets the words printed when the step is done
     * @returns {Promise<T>}
     */
    async step(name, work) {
      const from = now()
      let result = 'done'
      let heartbeat
      const announce = setTimeout(() => {
        line(`${name} …`)
        heartbeat = setInterval(() => line(`${name}: still at it (${seconds(now() - from)})`), HEARTBEAT_MS)
        heartbeat.unref()
      }, QUIET_MS)
      announce.unref()
      try {
        const value = await work((text) => (result = text))
        line(`${name}: ${result} (${seconds(now() - from)})`)
        return value
      } catch (error) {
        line(`${name}: failed (${seconds(now() - from)})`)
        throw error
      } finally {
        clearTimeout(announce)
        clearInterval(heartbeat)
      }
    },
  }
}
