/** What the forms of a run choose from. */
export interface ShowChoices {
  days: readonly { id: string; date: string }[]
  rigs: readonly { id: string; name: string }[]
  stages: readonly { id: string; label: string; zone: string | null }[]
  players: readonly { id: string; name: string }[]
  /** Who plays the shows of this tour so far. */
  usualPlayerId: string | null
}
