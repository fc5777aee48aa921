import type { ReactNode } from 'react'
import { Hoop } from '@/components/signature/hoop'
import { WhyTheseNumbers } from '@/components/kit/why-these-numbers'
import { kilonewtons } from '@/lib/acoustics/figure-words'
import {
  figureLine,
  headSideWords,
  openHeadWords,
  sheetCautionWords,
  sheetGaugeWords,
  sheetNoteWords,
  toleranceWords,
  warbleLimitWords,
} from '@/lib/advance/sheet-words'
import { lugOneRule, tapProtocol, tuningSteps } from '@/lib/advance/tuning-method'
import type { SheetHead, TuningSheet } from '@/lib/advance/tuning-sheet'
import { LugOrderDrawing } from './lug-order-drawing'

/** One drum's tuning sheet, without the blank columns that paper has. */
export function PackSheet({ sheet }: { sheet: TuningSheet }) {
  return (
    <article className="border-t-2 border-ink pt-2">
      <div className="flex items-start gap-4">
        <div className="min-w-0 grow">
          <h3 className="text-xl">{sheet.name}</h3>
          <p className="text-sm text-soft">{`${sheet.roleWord}, ${sheet.sizeWords}`}</p>
          {sheet.note ? (
            <p className="flex flex-wrap items-baseline gap-x-3">
              <span className="figures text-3xl font-bold">{sheet.note.hz.toFixed(1)} Hz</span>
              <span className="text-lg">{sheetNoteWords(sheet.note)}</span>
            </p>
          ) : (
            <p className="text-lg">No note set</p>
          )}
          <p className="text-sm">
            {[sheet.relationWords, sheet.muffling && `muffling: ${sheet.muffling}`].filter(Boolean).join('; ')}
          </p>
          {sheet.figures && <p className="mt-1 text-sm text-soft">{figureLine(sheet.figures)}.</p>}
        </div>
        <Hoop
          role={sheet.role}
          diameterIn={sheet.diameterIn}
          depthIn={sheet.depthIn}
          lugs={sheet.lugCount}
          name={sheet.name}
          note={sheet.note?.name ?? null}
          view="facing"
          pxPerInch={7}
        />
      </div>
      <div className="mt-3 grid grid-cols-1 gap-x-6 gap-y-4 sm:grid-cols-2">
        {sheet.heads.map((head) => (
          <Head key={head.side} sheet={sheet} head={head} />
        ))}
      </div>
      <p className="mt-3 text-sm">
        <span className="font-bold">How to tap.</span> {tapProtocol} {sheet.figures && openHeadWords(sheet.figures)}
      </p>
      <details className="mt-2">
        <summary className="min-h-7 w-fit text-sm font-bold underline underline-offset-4">
          The method in {tuningSteps.length} steps<span className="sr-only">, {sheet.name}</span>
        </summary>
        <ol className="mt-1 list-decimal pl-6 text-sm">
          {tuningSteps.map(({ name, words }) => (
            <li key={name} className="mt-1">
              <span className="font-bold">{name}.</span> {words}
            </li>
          ))}
        </ol>
      </details>
      {sheet.workedFrom && <WhyTheseNumbers name={sheet.name} input={sheet.workedFrom} />}
    </article>
  )
}

function Head({ sheet, head }: { sheet: TuningSheet; head: SheetHead }) {
  const { tap, tensionNPerM, rodPullN, rodPullBoundsN } = head
  const gauge = sheetGaugeWords(head.gauge)
  return (
    <section aria-label={`${sheet.name}, ${headSideWords[head.side].toLowerCase()}`} className="min-w-0">
      <div className="flex items-start justify-between gap-3 border-t border-line pt-1">
        <div className="min-w-0">
          <h4 className="font-bold">{headSideWords[head.side]}</h4>
          <p className="text-sm text-soft">{head.words}</p>
          {tap && (
            <>
              <p className="mt-1 text-sm text-soft">tap beside a lug</p>
              <p className="figures text-2xl leading-tight font-bold">{tap.hz.toFixed(1)} Hz</p>
              <p className="text-sm text-soft">
                <span className="figures">{`${tap.lowHz.toFixed(0)}–${tap.highHz.toFixed(0)}`}</span> near {tap.name}
              </p>
            </>
          )}
        </div>
        <LugOrderDrawing head={head} />
      </div>
      <dl className="mt-1 grid grid-cols-[5.5rem_minmax(0,1fr)] gap-x-3 gap-y-0.5 text-sm">
        <Row term="lug order">{head.order.join(', ')}</Row>
        <Row term="even within">{toleranceWords(sheet, head)}</Row>
        <Row term="warble">{warbleLimitWords(sheet, head.side)}</Row>
        <Row term="gauge">
          <span className="figures font-bold">{gauge.reading}</span>{' '}
          {gauge.bounds && <span className="figures text-soft">{gauge.bounds} </span>}
          <span className="text-soft">{gauge.worth}</span>
        </Row>
        {tensionNPerM && (
          <Row term="film">
            <span className="figures">{kilonewtons(tensionNPerM.value)} kN/m</span>{' '}
            <span className="figures text-soft">{`${kilonewtons(tensionNPerM.low)}–${kilonewtons(tensionNPerM.high)}`}</span>
          </Row>
        )}
        {rodPullN !== null && (
          <Row term="each rod">
            <span className="figures">{Math.round(rodPullN)} N</span>{' '}
            {rodPullBoundsN && (
              <span className="figures text-soft">{`${Math.round(rodPullBoundsN.low)}–${Math.round(rodPullBoundsN.high)}`}</span>
            )}
          </Row>
        )}
      </dl>
      {head.without && <p className="mt-1 text-sm">{head.without}</p>}
      {head.cautions.map((caution) => (
        <p key={caution} className="mt-1 border-l-4 border-spike pl-2 text-sm text-spike-text">
          {sheetCautionWords[caution]}
        </p>
      ))}
      <p className="sr-only">{lugOneRule}</p>
    </section>
  )
}

function Row({ term, children }: { term: string; children: ReactNode }) {
  return (
    <>
      <dt className="text-soft">{term}</dt>
      <dd className="min-w-0">{children}</dd>
    </>
  )
}
