// Outlives the run that started it by a moment: when that run is killed outright and its pipe closes, the guardian stops what the run had started.
// Lines on stdin: "+ PID SIGNAL" for a process group that now runs, "- PID" for one that has ended.
import { createInterface } from 'node:readline'
import { setTimeout as delay } from 'node:timers/promises'

const GRACE_MS = 8_000
const groups = new Map()

function signal(pid, name) {
  try {
    process.kill(-pid, name)
    return true
  } catch {
    return false
  }
}

for (const name of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(name, () => {})

createInterface({ input: process.stdin })
  .on('line', (line) => {
    const [sign, pid, stopSignal] = line.split(' ')
    if (sign === '+') groups.set(Number(pid), stopSignal)
    else groups.delete(Number(pid))
  })
  .on('close', async () => {
    for (const [pid, stopSignal] of groups) signal(pid, stopSignal)
    const until = Date.now() + GRACE_MS
    while (Date.now() < until && [...groups.keys()].some((pid) => signal(pid, 0))) await delay(100)
    for (const pid of groups.keys()) signal(pid, 'SIGKILL')
    process.exit(0)
  })
