import { spawn } from 'node:child_process'
import { closeSync, openSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { setTimeout as delay } from 'node:timers/promises'
import { fileURLToPath } from 'node:url'
import { Failure } from './failure.mjs'
import { fromRoot } from './place.mjs'
import { identityOf, isAlive } from './process-identity.mjs'

const GRACE_MS = 8_000
const GUARDIAN = fileURLToPath(new URL('guardian.mjs', import.meta.url))

/** @typedef {{ name: string, pid: number, ended: Promise<string>, over: boolean, log: string, stopSignal: NodeJS.Signals, last: boolean }} Service */

function signalGroup(pid, signal) {
  try {
    process.kill(-pid, signal)
    return true
  } catch (error) {
    if (error.code === 'ESRCH') return false
    if (error.code === 'EPERM') return true
    throw error
  }
}

async function waitUntilGone(pid, timeoutMs) {
  const until = Date.now() + timeoutMs
  while (Date.now() < until) {
    if (!signalGroup(pid, 0)) return true
    await delay(50)
  }
  return false
}

/** Stops processes that an earlier run left behind because it was killed outright. Returns their names. */
export async function sweepLeftovers(recordFile) {
  let records
  try {
    records = JSON.parse(readFileSync(recordFile, 'utf8'))
  } catch {
    return []
  }
  const left = records.filter(isAlive)
  for (const { pid, stopSignal } of left) signalGroup(pid, stopSignal)
  for (const { pid } of left) {
    if (!(await waitUntilGone(pid, GRACE_MS))) signalGroup(pid, 'SIGKILL')
  }
  rmSync(recordFile, { force: true })
  return left.map(({ name }) => name)
}

/** Everything one run starts: each program in a process group and with a log file of its own, all stopped together. */
export class Processes {
  /** @type {Map<number, Service>} */
  #running = new Map()
  #closed = false
  #guardian = null

  constructor({ place, env = process.env }) {
    this.place = place
    this.env = env
  }

  /** Whether all is being stopped, so that an ending is no surprise. */
  get closed() {
    return this.#closed
  }

  #watch(line) {
    if (!this.#guardian) {
      this.#guardian = spawn(process.execPath, [GUARDIAN], { detached: true, stdio: ['pipe', 'ignore', 'ignore'] })
      this.#guardian.stdin.on('error', () => {})
      this.#guardian.unref()
      this.#guardian.stdin.unref?.()
    }
    this.#guardian.stdin.write(`${line}\n`)
  }

  #record() {
    const records = [...this.#running.values()].map(({ name, identity, stopSignal }) => ({ name, stopSignal, ...identity }))
    writeFileSync(`${this.place.processesFile}.new`, JSON.stringify(records))
    renameSync(`${this.place.processesFile}.new`, this.place.processesFile)
  }

  /**
   * Starts a program that runs until it is stopped.
   * @param {string} name also the name of its log file
   * @param {{ env?: object, uid?: number, gid?: number, cwd?: string, stopSignal?: NodeJS.Signals, last?: boolean, show?: boolean, append?: boolean }} [options]
   *   `last`: is stopped after the others; `show`: writes to the terminal and not to a log
   * @returns {Service}
   */
  start(name, command, args, options = {}) {
    return this.#spawn(name, command, args, options).service
  }

  #spawn(name, command, args, options) {
    if (this.#closed) throw new Failure('Stopped.')
    const { env = {}, uid, gid, cwd = this.place.root, stopSignal = 'SIGTERM', last = false, show = false, input, capture, append = false } = options
    const log = join(this.place.logs, `${name}.log`)
    const out = show ? 'inherit' : openSync(log, append ? 'a' : 'w')
    const child = spawn(command, args, {
      cwd,
      // What goes to a log is read as plain text.
      env: { ...this.env, ...(show ? {} : { NO_COLOR: '1', FORCE_COLOR: undefined }), ...env },
      uid,
      gid,
      detached: true,
      stdio: [input === undefined ? 'ignore' : 'pipe', capture ? 'pipe' : out, out],
    })
    if (typeof out === 'number') closeSync(out)
    if (input !== undefined) {
      child.stdin.on('error', () => {})
      child.stdin.end(input)
    }
    let captured = ''
    child.stdout?.setEncoding('utf8').on('data', (text) => (captured += text))

    const { pid } = child
    const service = { name, pid, log, stopSignal, last, over: false, identity: pid ? identityOf(pid) : null }
    service.ended = new Promise((resolve) => {
      child.once('error', (error) => {
        service.over = true
        service.failedToStart = error
        resolve(error.message)
      })
      child.once('close', (code, signal) => {
        service.over = true
        service.code = code
        if (pid) {
          // What it started itself and left behind goes with it.
          signalGroup(pid, 'SIGKILL')
          this.#running.delete(pid)
          this.#record()
          this.#watch(`- ${pid}`)
        }
        resolve(signal ? `was ended by ${signal}` : `ended with exit code ${code}`)
      })
    })
    if (pid) {
      this.#running.set(pid, service)
      this.#record()
      this.#watch(`+ ${pid} ${stopSignal}`)
    }
    return { service, text: () => captured }
  }

  /**
   * Runs a program to its end. Its output goes to its log; with `capture` its standard output is returned.
   * @param {{ failure?: string, todo?: string, allowFailure?: boolean, capture?: boolean, input?: string }} [options]
   */
  async run(name, command, args, options = {}) {
    const { service, text } = this.#spawn(name, command, args, options)
    const how = await service.ended
    if (this.#closed) throw new Failure('Stopped.')
    const ok = service.code === 0
    if (!ok && !options.allowFailure) {
      throw new Failure(options.failure ?? `${name} ${how}.`, {
        todo: options.todo,
        log: options.show ? undefined : service.log,
        cause: service.failedToStart,
      })
    }
    return { ok, code: service.code, how, stdout: text(), log: service.log }
  }

  /** @param {Service} service */
  async stop(service) {
    if (service.over) return
    signalGroup(service.pid, service.stopSignal)
    const timer = delay(GRACE_MS, 'late', { ref: false })
    if ((await Promise.race([service.ended, timer])) === 'late' && !service.over) {
      signalGroup(service.pid, 'SIGKILL')
      await service.ended
    }
  }

  async stopAll() {
    this.#closed = true
    const services = [...this.#running.values()]
    await Promise.all(services.filter(({ last }) => !last).map((service) => this.stop(service)))
    for (const service of services.filter(({ last }) => last)) await this.stop(service)
    this.#guardian?.stdin.end()
    rmSync(this.place.processesFile, { force: true })
  }
}

/** The end of a log, to be shown beside a failure. */
export function lastLines(file, count = 20) {
  try {
    const lines = readFileSync(file, 'utf8').trimEnd().split('\n')
    return lines.slice(-count).join('\n')
  } catch {
    return `(${fromRoot(file)} cannot be read)`
  }
}
