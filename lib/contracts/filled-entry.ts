import { WARBLE_LIMIT_HZ } from '@/lib/tuning/warble-limit'
import type { DrumSpec, Entry, Head } from './kit'

/** What a drum or a head may lack that was written before it was asked. */
type StoredHead = Omit<Head, 'range'> & Partial<Pick<Head, 'range'>>
type StoredDrumSpec = Omit<DrumSpec, 'measuredTapRatio' | 'warbleLimitHz' | 'batter' | 'resonant'> &
  Partial<Pick<DrumSpec, 'measuredTapRatio' | 'warbleLimitHz'>> & { batter: StoredHead; resonant: StoredHead | null }

const filledHead = (head: StoredHead): Head => ({ ...head, range: head.range ?? null })

/** A kit entry as it lies in the database, with what came to drums later filled in: rows of an older release stay as they are. */
export function filledEntry(stored: Entry): Entry {
  if (stored.kind !== 'drum') return stored
  const spec: StoredDrumSpec = stored.spec
  return {
    ...stored,
    spec: {
      ...spec,
      measuredTapRatio: spec.measuredTapRatio ?? null,
      warbleLimitHz: spec.warbleLimitHz ?? WARBLE_LIMIT_HZ,
      batter: filledHead(spec.batter),
      resonant: spec.resonant && filledHead(spec.resonant),
    },
  }
}
