import { STANDARD_REFERENCE_HZ } from '@/lib/acoustics/note'
import { tryCalibration } from '@/lib/tuning/gauge-of-head'
import { WARBLE_LIMIT_HZ } from '@/lib/tuning/warble-limit'
import { outputsOf, pieceName } from '@/plots/symbols/piece-kinds'
import { packCautions } from './cautions'
import { changeSentences, compareSpecs } from './compare-specs'
import type { FrozenDrum, FrozenEntry } from './frozen-kit'
import { entriesInOrder } from './frozen-kit'
import { kitPieces } from './kit-pieces'
import { outputWords, typeWords } from './kit-words'
import { insteadOfWords, lineDetails, lineWords } from './line-content'
import type {
  Fact,
  PackAudience,
  PackChannel,
  PackContact,
  PackDocument,
  PackLine,
  PackPlot,
  PackShow,
} from './pack-document'
import { PACK_SCHEMA_VERSION } from './pack-document'
import { hireFacts, venueFacts } from './pack-facts'
import type { PackContactInput, PackInput, PackRecipient, PackShowInput } from './pack-input'
import type { RevisionDocument, RigSpec } from './revision-document'
import { isAskedOf } from './standing'
import { tuningSheet } from './tuning-sheet'
import { dateWords, instantWords, whenWords } from './when-words'

/**
 * What one recipient gets of a revision: a venue the whole of one show, a supplier the lines of one hire. Fields are picked
 * one by one, so nothing that this reader must not see can ride along. Pure.
 */
export function composePack(input: PackInput): PackDocument {
  const { revision, recipient, previous } = input
  const document = revision.document
  const audience = recipient.kind
  const shows = recipient.kind === 'venue' ? [recipient.show] : recipient.shows
  const place = recipient.kind === 'venue' ? recipient.show.venue : recipient.hire.supplier
  const calibration = document.gauge && tryCalibration(document.gauge).calibration
  return {
    schemaVersion: PACK_SCHEMA_VERSION,
    audience,
    locale: recipient.locale,
    units: document.party.units,
    paper: document.party.paper,
    party: document.party.name,
    tour: document.tour.name,
    rig: document.rig.name,
    revision: { number: revision.number, issued: dateWords(revision.issuedAt.slice(0, 10)), note: revision.note },
    recipient: { name: place.name, place: [place.town, place.country].filter(Boolean).join(', ') },
    shows: shows.map(packShow),
    answersDue: answersDue(recipient),
    facts: recipient.kind === 'venue' ? venueFacts(recipient.show, document) : hireFacts(recipient.hire),
    contacts: input.contacts.filter((contact) => maySee(recipient, contact)).map(packContact),
    changed: previous && {
      sinceRevision: previous.number,
      sentences: changeSentences(compareSpecs(seenBy(audience, previous.document), seenBy(audience, document))),
    },
    plot: recipient.kind === 'venue' ? packPlot(document, recipient.show, recipient.locale) : null,
    channels: recipient.kind === 'venue' ? packChannels(document, recipient.locale) : [],
    lines: packLines(document, recipient),
    sheets:
      recipient.kind === 'venue'
        ? entriesInOrder(document.kit)
            .filter(isDrum)
            .map((drum) =>
              tuningSheet(drum, {
                locale: recipient.locale,
                units: document.party.units,
                referenceHz: document.party.referenceHz,
                calibration,
              }),
            )
        : [],
    cautions: packCautions(audience),
  }
}

function isDrum(entry: FrozenEntry): entry is FrozenDrum {
  return entry.kind === 'drum'
}

function packShow(show: PackShowInput): PackShow {
  const times: Fact[] = [
    ...(show.loadInTime ? [{ label: 'Load-in', words: whenWords(show.date, show.loadInTime, show.zone) }] : []),
    ...(show.showTime
      ? [{ label: 'Show', words: whenWords(show.date, show.showTime, show.zone, show.showDayOffset) }]
      : []),
  ]
  const where = [show.venue.name, show.venue.town].filter(Boolean).join(', ')
  return {
    showId: show.id,
    title: show.name === '' ? where : `${show.name}: ${where}`,
    date: dateWords(show.date),
    times,
  }
}

function answersDue(recipient: PackRecipient): string | null {
  const { answersDueAt, zone } = recipient.kind === 'venue' ? recipient.show : recipient.hire
  return answersDueAt ? instantWords(answersDueAt, zone) : null
}

/** A reader sees the party's contacts and those of its own house. */
function maySee(recipient: PackRecipient, { of }: PackContactInput): boolean {
  if (of.kind === 'party') return true
  const own = recipient.kind === 'venue' ? recipient.show.venue.id : recipient.hire.supplier.id
  return of.kind === recipient.kind && of.id === own
}

function packContact({ name, duty, email, phone }: PackContactInput): PackContact {
  return { name, duty, email, phone }
}

/** The part of a rig that an audience is told of, for telling it what changed. */
function seenBy(audience: PackAudience, spec: RigSpec): RigSpec {
  if (audience === 'venue') return spec
  return {
    ...spec,
    party: { ...spec.party, referenceHz: STANDARD_REFERENCE_HZ },
    kit: spec.kit.filter((entry) => entry.supply === 'rented').map(untuned),
    plot: { sequence: 0, document: { ...spec.plot.document, pieces: {} } },
    channels: [],
    gauge: null,
  }
}

/** A drum without what only its tuner reads. */
function untuned(entry: FrozenEntry): FrozenEntry {
  if (entry.kind !== 'drum') return entry
  const spec = entry.spec
  return {
    ...entry,
    spec: {
      ...spec,
      note: null,
      noteLocked: false,
      headRelationCents: 0,
      measuredTapRatio: null,
      toleranceCents: 0,
      warbleLimitHz: WARBLE_LIMIT_HZ,
      muffling: '',
      batter: { ...spec.batter, gauge: null, range: null },
      resonant: spec.resonant && { ...spec.resonant, gauge: null, range: null },
    },
  }
}

function packLines(document: RevisionDocument, recipient: PackRecipient): PackLine[] {
  const someoneIsHired = recipient.kind === 'supplier' || recipient.show.supplierNames.length > 0
  return document.lines
    .filter((line) => recipient.kind === 'venue' || line.content.supply === 'rented')
    .map((line) => {
      const { supply } = line.content
      const asked = isAskedOf(recipient.kind, supply, someoneIsHired)
      return {
        number: line.position,
        lineId: line.lineId,
        hash: line.hash,
        count: line.content.count,
        kind: line.content.kind,
        words: lineWords(line.content, document.party.units),
        details: lineDetails(line.content),
        insteadOf: insteadOfWords(line.content),
        supply,
        broughtBy: asked ? 'you' : recipient.kind === 'venue' ? recipient.show.supplierNames.join(', ') : '',
        asked,
      }
    })
}

function packPlot(document: RevisionDocument, show: PackShowInput, locale: string): PackPlot | null {
  if (Object.keys(document.plot.document.pieces).length === 0) return null
  return {
    document: document.plot.document,
    kit: kitPieces(document, locale),
    channels: document.channels.flatMap(({ pieceId, output, number }) =>
      pieceId ? [{ pieceId, output, number }] : [],
    ),
    stage: { widthM: show.stage.widthM, depthM: show.stage.depthM },
    stageName: `${show.venue.name}, ${show.stage.name}`,
  }
}

function packChannels(document: RevisionDocument, locale: string): PackChannel[] {
  const kit = new Map(kitPieces(document, locale).map((piece) => [piece.id, piece]))
  return [...document.channels]
    .sort((a, b) => a.number - b.number)
    .map(({ number, name, pieceId, output, stand, phantom }) => {
      const piece = pieceId ? document.plot.document.pieces[pieceId] : undefined
      const aimed = piece?.aim ? document.plot.document.pieces[piece.aim.pieceId] : undefined
      const source = piece
        ? [
            pieceName(piece, kit),
            ...(aimed ? [` on ${pieceName(aimed, kit)}`] : []),
            ...(outputsOf(piece).length > 1 && output !== '' ? [`, ${outputWords(output)}`] : []),
          ].join('')
        : ''
      return { number, name, source, stand: typeWords(stand), phantom }
    })
}
