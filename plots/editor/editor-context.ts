import type { Channel } from '@/lib/contracts/channel'
import type { KitById } from '../model/kit-piece'
import type { Piece, PlotDocument } from '../model/document'
import type { PlotAction } from '../model/command'
import type { ChannelNumbers } from '../render/build-scene'
import type { LengthUnits } from '../symbols/length-words'

/** What every part of the editor works on. */
export interface EditorParts {
  readonly rigId: string
  readonly document: PlotDocument
  readonly kit: KitById
  readonly channels: readonly Channel[]
  readonly channelNumbers: ChannelNumbers
  readonly units: LengthUnits
  readonly mayEdit: boolean
  readonly mayPatch: boolean
  /** One step of the person; returns why it was refused, or null. `said` is read out when it was done. */
  readonly act: (actions: readonly PlotAction[], said: string) => string | null
  readonly nameOf: (piece: Piece) => string
}
