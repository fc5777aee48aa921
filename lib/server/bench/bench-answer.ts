import type { ReadingRow, SignOffRow } from '@/db/queries/bench'
import type { FrozenDrumSpec } from '@/lib/advance/frozen-kit'
import { drumSizeWords } from '@/lib/advance/kit-words'
import type { RevisionDocument } from '@/lib/advance/revision-document'
import type { SheetHead } from '@/lib/advance/tuning-sheet'
import { tuningSheet } from '@/lib/advance/tuning-sheet'
import type { BenchDrum, BenchHead, BenchReading, BenchSignOff } from '@/lib/contracts/bench'
import type { GaugeCalibration } from '@/lib/tuning/gauge-calibration'
import { evenLugAngles } from '@/lib/tuning/lug-angles'
import type { NightDrum } from './read-night-sheet'

/** A drum of the night as the bench shows it. */
export function benchDrum(
  drum: NightDrum,
  party: RevisionDocument['party'],
  calibration: GaugeCalibration | null,
): BenchDrum {
  const sheet = tuningSheet(drum, { ...party, calibration })
  return {
    ...{ entryId: sheet.entryId, name: sheet.name, role: sheet.role, sizeWords: sheet.sizeWords },
    ...{ lugCount: sheet.lugCount, lugAnglesRad: evenLugAngles(sheet.lugCount), toleranceCents: sheet.toleranceCents },
    ...{ warbleLimitHz: sheet.warbleLimitHz, muffling: sheet.muffling, relationWords: sheet.relationWords },
    instead: drum.instead && {
      words: drum.instead.words,
      // A drum's line is only ever answered about a drum.
      askedWords: drumSizeWords(drum.instead.askedSpec as FrozenDrumSpec, party.units),
    },
    missing: drum.missing > 0,
    heads: sheet.heads.map(benchHead),
  }
}

function benchHead({ side, words, note, tap, rodPullN, gauge, cautions, without }: SheetHead): BenchHead {
  return { side, words, note, tap, rodPullN, gauge, cautions: [...cautions], without }
}

export function benchReading(row: ReadingRow): BenchReading {
  return {
    ...{ id: row.id, entryId: row.kitEntryId, side: row.side, lug: row.lug },
    ...{ method: row.method, value: row.value, unit: row.unit, targetHz: row.targetHz },
    ...{ otherHead: row.otherHead, onStand: row.onStand, gauge: row.gauge, temperatureC: row.temperatureC },
    ...{ pass: row.pass, strikes: row.strikesReadingId, deviceId: row.deviceId, deviceSequence: row.deviceSequence },
    ...{ deviceAt: row.deviceAt.toISOString(), serverAt: row.serverAt.toISOString() },
    ...{ byName: row.byName, via: row.personId === null ? 'link' : 'person' },
  }
}

export function benchSignOff(row: SignOffRow): BenchSignOff {
  const { id, kitEntryId, decision, byName, remark, at } = row
  return { id, entryId: kitEntryId, decision, byName, remark, at: at.toISOString() }
}
