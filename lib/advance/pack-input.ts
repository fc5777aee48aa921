import type { StageSize } from '@/plots/model/document'
import type { RevisionDocument } from './revision-document'

export interface PackPlace {
  readonly id: string
  readonly name: string
  readonly town: string
  readonly country: string
}

export interface PackStage extends StageSize {
  readonly name: string
  readonly heightM: number
  readonly access: readonly string[]
  readonly volts: number | null
  readonly mainsHz: number | null
  readonly inlets: string
}

export interface PackShowInput {
  readonly id: string
  /** YYYY-MM-DD. */
  readonly date: string
  readonly name: string
  readonly venue: PackPlace
  readonly stage: PackStage
  readonly zone: string | null
  readonly loadInTime: string | null
  readonly showTime: string | null
  readonly showDayOffset: number
  readonly answersDueAt: string | null
  readonly slot: { readonly changeoverMin: number; readonly lineCheckMin: number; readonly riserParking: string } | null
  readonly sharedKit: { readonly owner: string; readonly mayRetune: boolean; readonly maySwap: string } | null
  readonly player: {
    readonly name: string
    readonly hand: 'right' | 'left'
    readonly throneHeightM: number | null
    readonly mixes: string
  }
  /** Who brings the rented things to this show; empty when nobody is hired yet. */
  readonly supplierNames: readonly string[]
}

export interface PackHireInput {
  readonly id: string
  readonly supplier: PackPlace
  readonly zone: string | null
  readonly deliveryDate: string | null
  readonly deliveryFrom: string | null
  readonly deliveryUntil: string | null
  readonly collectionDate: string | null
  readonly collectionFrom: string | null
  readonly collectionUntil: string | null
  readonly receiver: string
  readonly conditionOnReturn: string
  readonly poNumber: string
  readonly answersDueAt: string | null
}

/** Somebody who could stand on a pack; whose contact it is decides who may read of it. */
export interface PackContactInput {
  readonly of: { readonly kind: 'party' } | { readonly kind: 'venue' | 'supplier'; readonly id: string }
  readonly name: string
  readonly duty: string
  readonly email: string
  readonly phone: string
}

export type PackRecipient =
  | { readonly kind: 'venue'; readonly locale: string; readonly show: PackShowInput }
  | {
      readonly kind: 'supplier'
      readonly locale: string
      readonly hire: PackHireInput
      readonly shows: readonly PackShowInput[]
    }

export interface PackInput {
  readonly revision: {
    readonly number: number
    readonly issuedAt: string
    readonly note: string
    readonly document: RevisionDocument
  }
  readonly recipient: PackRecipient
  readonly contacts: readonly PackContactInput[]
  /** The revision of the last pack that was sent to this recipient. */
  readonly previous: { readonly number: number; readonly document: RevisionDocument } | null
}
