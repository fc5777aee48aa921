import { linkSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs'
import { setTimeout as delay } from 'node:timers/promises'
import { identityOf, isAlive } from './process-identity.mjs'

function readText(file) {
  try {
    return readFileSync(file, 'utf8')
  } catch (error) {
    if (error.code === 'ENOENT') return null
    throw error
  }
}

function parse(text) {
  try {
    return JSON.parse(text)
  } catch {
    // A lock whose writer died half-way is nobody's.
    return { pid: 0 }
  }
}

/** Who holds a lock now, or null. */
export function holderOf(file) {
  const text = readText(file)
  if (text === null) return null
  const record = parse(text)
  return isAlive(record) ? record : null
}

/**
 * Takes a lock file for this process.
 * @returns {{ taken: true, stale: boolean, note: (more: object) => void, release: () => void } | { taken: false, holder: object }}
 */
export function takeLock(file, about = {}) {
  let record = { ...identityOf(process.pid), startedAt: new Date().toISOString(), ...about }
  let stale = false
  // Written whole beside its place and linked in: nobody ever reads half a lock.
  const draft = `${file}.${process.pid}`
  writeFileSync(draft, JSON.stringify(record))
  try {
    for (;;) {
      try {
        linkSync(draft, file)
        break
      } catch (error) {
        if (error.code !== 'EEXIST') throw error
      }
      const text = readText(file)
      if (text === null) continue
      const found = parse(text)
      if (isAlive(found)) return { taken: false, holder: found }
      stale = true
      setAside(file, text)
    }
  } finally {
    rmSync(draft, { force: true })
  }
  return {
    taken: true,
    stale,
    note(more) {
      record = { ...record, ...more }
      writeFileSync(draft, JSON.stringify(record))
      renameSync(draft, file)
    },
    release() {
      if (parse(readText(file) ?? '{}').pid === process.pid) rmSync(file, { force: true })
    },
  }
}

/** Removes a dead process's lock, unless another process has put its own there meanwhile. */
function setAside(file, deadText) {
  const aside = `${file}.dead.${process.pid}`
  try {
    renameSync(file, aside)
  } catch (error) {
    if (error.code === 'ENOENT') return
    throw error
  }
  if (readText(aside) !== deadText) {
    try {
      linkSync(aside, file)
    } catch (error) {
      if (error.code !== 'EEXIST') throw error
    }
  }
  rmSync(aside, { force: true })
}

/** Runs `work` while holding the lock, waiting for whoever holds it first. */
export async function withLock(file, work, { onWait = () => {}, everyMs = 200 } = {}) {
  let lock = takeLock(file)
  if (!lock.taken) onWait(lock.holder)
  while (!lock.taken) {
    await delay(everyMs)
    lock = takeLock(file)
  }
  try {
    return await work()
  } finally {
    lock.release()
  }
}
