import { z } from 'zod'
import { plotCommandSchema } from '@/lib/contracts/plot'
import type { PlotCommand } from '@/plots/model/command'

/** Commands kept on this device until the server has them. */
export interface Unsent {
  /** The sequence they were made on. */
  readonly baseSequence: number
  readonly commands: readonly PlotCommand[]
}

export interface UnsentStore {
  /** False when the device refused to keep them (storage full or switched off). */
  keep(unsent: Unsent): boolean
  /** What earlier pages of this person and rig left behind, and how to clear it once it is in hand here. */
  takeOver(): Promise<{ readonly left: readonly Unsent[]; readonly clear: () => void }>
}

const keptSchema = z.object({ baseSequence: z.number().int().min(0), commands: z.array(plotCommandSchema) })

/**
 * Keeps a page's unsent commands in the browser's storage. Each page has a place of its own, so two tabs never
 * overwrite each other; a page that opens later takes over what closed pages left. A lock that the browser frees when
 * a tab ends tells closed from open. Where there are no locks everything is taken over: the server knows a command by
 * its id, so one sent twice stands once.
 */
export function browserUnsentStore(owner: { personId: string; rigId: string }, pageId: string): UnsentStore {
  const prefix = `hoopwright plot ${owner.personId} ${owner.rigId} `
  const ownKey = prefix + pageId
  const locks = typeof navigator === 'undefined' ? undefined : navigator.locks
  void locks?.request(ownKey, () => new Promise<never>(() => undefined))
  return {
    keep(unsent) {
      try {
        if (unsent.commands.length === 0) localStorage.removeItem(ownKey)
        else localStorage.setItem(ownKey, JSON.stringify(unsent))
        return true
      } catch {
        // Full or forbidden storage; the caller tells the person.
        return false
      }
    },
    async takeOver() {
      const left: Unsent[] = []
      const taken: string[] = []
      for (const key of storedKeys(prefix)) {
        if (key === ownKey || !(await isFree(locks, key))) continue
        const kept = keptSchema.safeParse(readJson(key))
        if (kept.success) left.push(kept.data)
        taken.push(key)
      }
      return { left, clear: () => taken.forEach((key) => localStorage.removeItem(key)) }
    },
  }
}

function storedKeys(prefix: string): string[] {
  try {
    return Array.from({ length: localStorage.length }, (_, index) => localStorage.key(index) ?? '').filter((key) =>
      key.startsWith(prefix),
    )
  } catch {
    return []
  }
}

function readJson(key: string): unknown {
  try {
    return JSON.parse(localStorage.getItem(key) ?? 'null')
  } catch {
    return null
  }
}

async function isFree(locks: LockManager | undefined, key: string): Promise<boolean> {
  if (!locks) return true
  return locks.request(key, { ifAvailable: true }, (lock) => lock !== null)
}
