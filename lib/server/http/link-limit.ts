import type { Limit } from './rate-limit'
import { takeFromLimit } from './rate-limit'

const usesPerAddress: Limit = { name: 'link', points: 600, seconds: 60 }

/** Counts one use of a link from an address, before the key is looked at: guessing and flooding end here. */
export async function takeFromLinkLimit(address: string): Promise<void> {
  await takeFromLimit(usesPerAddress, address)
}
