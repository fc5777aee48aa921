import type { NoteReader } from '@/lib/contracts/kit-form'

/** How the party writes sizes and notes. */
export type KitReader = NoteReader & { units: 'metric' | 'imperial' }
