export const dayKinds = ['show', 'travel', 'off', 'rehearsal'] as const
export type DayKind = (typeof dayKinds)[number]
/** A festival slot: minutes, and where a rolling riser may wait. */
export type Slot = { changeoverMin: number; lineCheckMin: number; riserParking: string }
/** A kit shared with other acts: whose it is and what may be done to it. */
export type SharedKit = { owner: string; mayRetune: boolean; maySwap: string }
