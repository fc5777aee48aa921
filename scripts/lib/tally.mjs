import { Failure } from './failure.mjs'
import { fromRoot } from './place.mjs'
import { lastLines } from './processes.mjs'
import { tellFailure } from './session.mjs'

/** How much of what went wrong is shown; the rest is in the log. */
const SHOWN_LINES = 200

const write = (text) => process.stdout.write(text)

/** What passed and what failed: tests one by one, and each check beside them as one. */
export class Tally {
  passed = 0
  failed = 0

  /** Runs a check; a failure is shown and counted, and the run goes on. Returns what the check made, or null. */
  async check({ steps, processes }, name, work) {
    try {
      const made = await steps.step(name, work)
      this.passed += 1
      return made ?? null
    } catch (error) {
      // Being stopped is no verdict on the check.
      if (processes.closed) throw error
      tellFailure(error, { write, lines: SHOWN_LINES })
      this.failed += 1
      return null
    }
  }

  /** Runs a suite of tests and adds up its own counts. */
  async suite({ steps, processes }, name, work) {
    const { passed, failed, notes, log } = await steps.step(name, async (say) => {
      const counted = await work()
      say(`${counted.passed} passed, ${counted.failed} failed`)
      return counted
    })
    if (processes.closed) throw new Failure('Stopped.')
    this.passed += passed
    this.failed += failed
    if (failed > 0) write(`\nFrom ${fromRoot(log)}:\n${lastLines(log, SHOWN_LINES)}\n${notes.map((note) => `${note}\n`).join('')}\n`)
  }

  /** Counts something that could not be done as one failure. */
  miss(why) {
    if (typeof why === 'string') write(`\n${why}\n`)
    this.failed += 1
  }

  /** The last line of the run. */
  print() {
    write(`${this.passed} passed, ${this.failed} failed\n`)
  }
}
