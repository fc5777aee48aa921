import { readFileSync, readlinkSync } from 'node:fs'

/** The fields of a process's /proc stat from its state on, or null when it is gone or the system keeps no /proc. */
function statOf(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8')
    // The name in brackets may itself hold spaces and brackets; the fields are counted from its end.
    return stat.slice(stat.lastIndexOf(')') + 2).split(' ')
  } catch {
    return null
  }
}

/**
 * When a process began, in clock ticks since boot: with the number it tells a process from a later one that was given the same number.
 * Null where the system keeps no /proc, or the process is gone.
 */
export function startTicksOf(pid) {
  const stat = statOf(pid)
  return stat === null || stat[0] === 'Z' ? null : Number(stat[19])
}

/** The process that started a process, or 0 when it cannot be known. */
export function parentOf(pid) {
  return Number(statOf(pid)?.[1] ?? 0)
}

export function identityOf(pid) {
  return { pid, startTicks: startTicksOf(pid) }
}

/** Whether the very process that was noted down still runs. */
export function isAlive({ pid, startTicks = null }) {
  if (!Number.isInteger(pid) || pid <= 0) return false
  if (startTicks !== null) return startTicksOf(pid) === startTicks
  try {
    process.kill(pid, 0)
    return true
  } catch (error) {
    return error.code === 'EPERM'
  }
}

/** The folder a process works in, or null when it cannot be known. */
export function workingFolderOf(pid) {
  try {
    return readlinkSync(`/proc/${pid}/cwd`)
  } catch {
    return null
  }
}
