import { readFileSync, readlinkSync } from 'node:fs'

/**
 * When a process began, in clock ticks since boot: with the number it tells a process from a later one that was given the same number.
 * Null where the system keeps no /proc, or the process is gone.
 */
export function startTicksOf(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8')
    // The name in brackets may itself hold spaces and brackets; the fields are counted from its end.
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ')
    return fields[0] === 'Z' ? null : Number(fields[19])
  } catch {
    return null
  }
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
