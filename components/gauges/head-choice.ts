import { parsePlies } from '@/lib/staging/plies'
import type { KnownHead } from '@/lib/contracts/gauge'
import { drumSpecSchema, headSchema } from '@/lib/contracts/kit'
import type { GaugeHead } from '@/lib/tuning/gauge-profile'

/** A head asked about: one of the kits' by its words, or any other as it is typed. */
export interface HeadChoice {
  /** Words of a known head; empty: the typed one. */
  readonly known: string
  readonly diameterIn: string
  readonly depthIn: string
  readonly plyMils: string
}

const size = (text: string) => Number(text.trim().replace(',', '.'))

/** The head that is asked about with its words; null while what is typed makes none. */
export function chosenHead(
  choice: HeadChoice,
  heads: readonly KnownHead[],
): { words: string; head: GaugeHead; tapHz: number | null } | null {
  const known = heads.find(({ words }) => words === choice.known)
  if (known) {
    const { diameterIn, depthIn, plyMils, coatingGPerM2, openShell, words, tapHz } = known
    return { words, head: { diameterIn, depthIn, plyMils, coatingGPerM2, openShell }, tapHz }
  }
  const diameterIn = drumSpecSchema.shape.diameterIn.safeParse(size(choice.diameterIn)).data
  const depthIn = drumSpecSchema.shape.depthIn.safeParse(size(choice.depthIn)).data
  const plyMils = headSchema.shape.plyMils.safeParse(parsePlies(choice.plyMils).plyMils).data
  if (diameterIn === undefined || depthIn === undefined || plyMils === undefined) return null
  return {
    words: `a head of ${diameterIn}×${depthIn} in, ${plyMils.join(' + ')} mil`,
    head: { diameterIn, depthIn, plyMils, coatingGPerM2: 0 },
    tapHz: null,
  }
}
