import { setTimeout as wait } from 'node:timers/promises'

/** Does the work and answers no sooner than `floorMs`: how long it took must not tell whether an address is known. */
export async function evenTime<Answer>(floorMs: number, work: () => Promise<Answer>): Promise<Answer> {
  const floor = wait(floorMs)
  try {
    return await work()
  } finally {
    await floor
  }
}
