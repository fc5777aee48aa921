import { existsSync } from 'node:fs'
import { Failure } from './failure.mjs'
import { takeLock } from './lock.mjs'
import { fromRoot } from './place.mjs'
import { identityOf, isAlive, parentOf } from './process-identity.mjs'
import { Processes, lastLines, sweepLeftovers } from './processes.mjs'
import { createSteps } from './steps.mjs'

const PARENT_CHECK_MS = 1_000
const SIGNALS = { SIGINT: 130, SIGTERM: 143, SIGHUP: 129 }

/** Prints a failure: one sentence, the lines that show why, what to do. */
export function tellFailure(error, { write = (text) => process.stderr.write(text), lines = 20 } = {}) {
  if (!(error instanceof Failure)) {
    write(`\nThis should not have happened: ${error?.stack ?? error}\n`)
    return
  }
  if (error.log && existsSync(error.log)) write(`\nFrom ${fromRoot(error.log)}:\n${lastLines(error.log, lines).replace(/^/gm, '  | ')}\n`)
  if (error.output) write(`\n${error.output.trimEnd().replace(/^/gm, '  | ')}\n`)
  const why = error.cause?.message && !error.log ? ` (${error.cause.message})` : ''
  write(`\n${error.message}${why}\n`)
  if (error.todo) write(`${error.todo}\n`)
}

function tellHeld(place, holder) {
  const where = holder.address ? ` at ${holder.address}` : ''
  return new Failure(
    `${holder.what} already runs here${where}: process ${holder.pid}, since ${holder.startedAt.replace('T', ' ').slice(0, 19)} UTC.`,
    { todo: `Stop that one first: Ctrl-C in its terminal, or  kill ${holder.pid}` },
  )
}

/**
 * The life of one run: takes its lock, clears what a run that was killed left behind, does the work, and whatever happens stops everything it started.
 * @param {{ place: object, what: string, env?: object }} about
 * @param {(run: object) => Promise<number | void>} work returns an exit code; from when it sets `run.running`, being stopped is a normal end
 * @param {(failure: unknown) => void} [onFailure] has the last word on the output
 */
export async function runSession({ place, what, env = process.env }, work, onFailure = () => {}) {
  const steps = createSteps()
  const taken = takeLock(place.lockFile, { what })
  if (!taken.taken) {
    const held = tellHeld(place, taken.holder)
    tellFailure(held)
    onFailure(held)
    process.exit(1)
  }
  const processes = new Processes({ place, env })
  const run = { place, steps, processes, lock: taken, tell: steps.line, running: false }
  let ending = false

  const end = async (exitCode) => {
    if (ending) return
    ending = true
    await processes.stopAll()
    taken.release()
    process.exit(exitCode)
  }
  for (const [signal, exitCode] of Object.entries(SIGNALS)) {
    process.on(signal, () => {
      // npm passes Ctrl-C on, so it often comes twice.
      if (ending) return
      steps.line(`Stopping (${signal}) …`)
      void end(run.running ? 0 : exitCode).catch((error) => {
        tellFailure(error)
        process.exit(1)
      })
    })
  }
  watchParent(() => end(1))
  // A closed terminal must not keep us from stopping what we started.
  for (const stream of [process.stdout, process.stderr]) stream.on('error', () => {})

  let exitCode
  try {
    if (taken.stale) steps.line('An earlier run here ended without cleaning up')
    const swept = await sweepLeftovers(place.processesFile)
    if (swept.length > 0) steps.line(`Stopped what it had left running: ${swept.join(', ')}`)
    exitCode = (await work(run)) ?? 0
  } catch (error) {
    if (ending) return
    tellFailure(error)
    onFailure(error)
    exitCode = 1
  }
  await end(exitCode)
}

/** npm can be killed outright; then nobody is left to pass Ctrl-C on, and we stop by ourselves. */
function watchParent(stop) {
  if (!process.env['npm_lifecycle_event']) return
  // npm runs its scripts through a shell, which would go on waiting without it.
  const above = [process.ppid, parentOf(process.ppid)].filter((pid) => pid > 1).map(identityOf)
  const timer = setInterval(() => {
    if (above.every(isAlive)) return
    clearInterval(timer)
    void stop()
  }, PARENT_CHECK_MS)
  timer.unref()
}
