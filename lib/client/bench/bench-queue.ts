import type { ReadingInput, SignOffInput } from '@/lib/contracts/bench'

/** Something logged on this device that the server does not have yet. */
export type QueuedItem = {
  /** The device's running number: readings and sign-offs are sent in this order. */
  readonly sequence: number
  /** Why the server would not take it; null while it waits to be sent. */
  readonly refused: string | null
} & (
  | { readonly kind: 'reading'; readonly reading: ReadingInput }
  | { readonly kind: 'sign-off'; readonly signOff: SignOffInput }
)

export type KeyValueStorage = Pick<Storage, 'getItem' | 'setItem' | 'removeItem' | 'key' | 'length'>

export interface BenchQueue {
  /** This device's id and its next number. Each number is given once. */
  next(): { deviceId: string; sequence: number }
  /** False when the device would not keep it: it then lives only as long as this page. */
  keep(item: QueuedItem): boolean
  /** Everything kept, in order; what another tab kept for the same bench too. */
  items(): QueuedItem[]
  drop(sequence: number): void
}

const deviceKey = 'hoopwright bench device'

/**
 * Keeps what was logged in the device's storage until the server has it. Every item has a place of its own, so tabs never
 * overwrite each other and a page that reloads finds all of them; one sent by two tabs stands once, for its id.
 * @param place whose bench: `link` or a person, and the show
 */
export function createBenchQueue(storage: KeyValueStorage | null, place: string, newId: () => string): BenchQueue {
  const prefix = `hoopwright bench ${place} `
  const keyOf = (sequence: number) => `${prefix}${String(sequence).padStart(10, '0')}`
  const unkept = new Map<string, QueuedItem>()
  let device: { id: string; sequence: number } | null = null

  function readStored(key: string): string | null {
    try {
      return storage?.getItem(key) ?? null
    } catch {
      return null
    }
  }

  function store(key: string, value: string): boolean {
    try {
      storage?.setItem(key, value)
      return storage !== null
    } catch {
      // Full or forbidden storage; the caller tells the person.
      return false
    }
  }

  return {
    next() {
      const kept = readDevice(readStored(deviceKey))
      // The higher of the two: another tab may have gone on counting, or this device may have refused to keep the count.
      const from = kept && (device?.id !== kept.id || kept.sequence >= device.sequence) ? kept : device
      device = from ? { id: from.id, sequence: from.sequence + 1 } : { id: newId(), sequence: 1 }
      store(deviceKey, JSON.stringify(device))
      return { deviceId: device.id, sequence: device.sequence }
    },
    keep(item) {
      const key = keyOf(item.sequence)
      if (store(key, JSON.stringify(item))) {
        unkept.delete(key)
        return true
      }
      unkept.set(key, item)
      return false
    },
    items() {
      const kept = storedKeys(storage, prefix).flatMap((key) => (unkept.has(key) ? [] : readItem(readStored(key))))
      return [...kept, ...unkept.values()].sort((a, b) => a.sequence - b.sequence)
    },
    drop(sequence) {
      unkept.delete(keyOf(sequence))
      try {
        storage?.removeItem(keyOf(sequence))
      } catch {
        // Storage that cannot be changed: the item is sent again, and stands once for its id.
      }
    },
  }
}

function storedKeys(storage: KeyValueStorage | null, prefix: string): string[] {
  try {
    return Array.from({ length: storage?.length ?? 0 }, (_, index) => storage?.key(index) ?? '').filter((key) =>
      key.startsWith(prefix),
    )
  } catch {
    return []
  }
}

function readDevice(stored: string | null): { id: string; sequence: number } | null {
  const value = parsed(stored)
  if (!isRecord(value)) return null
  const { id, sequence } = value
  return typeof id === 'string' && typeof sequence === 'number' && Number.isSafeInteger(sequence)
    ? { id, sequence }
    : null
}

/** What was kept by this or an earlier page; anything else that lies there is left alone. */
function readItem(stored: string | null): QueuedItem[] {
  const value = parsed(stored)
  if (!isRecord(value) || typeof value['sequence'] !== 'number') return []
  const whole =
    (value['kind'] === 'reading' && isRecord(value['reading'])) ||
    (value['kind'] === 'sign-off' && isRecord(value['signOff']))
  // The server checks every field of it again when it is sent.
  return whole ? [value as unknown as QueuedItem] : []
}

function parsed(stored: string | null): unknown {
  try {
    return JSON.parse(stored ?? 'null')
  } catch {
    return null
  }
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null
}
