import { Hoop } from '@/components/signature/hoop'
import type { SheetHead, SheetNote, TuningSheet } from '@/lib/advance/tuning-sheet'

/** One drum's tuning sheet, without the blank columns that paper has. */
export function PackSheet({ sheet }: { sheet: TuningSheet }) {
  const [batter] = sheet.heads
  return (
    <article className="border-t-2 border-ink pt-2">
      <div className="flex items-start gap-4">
        <div className="min-w-0 grow">
          <h3 className="text-xl">{sheet.name}</h3>
          <p className="text-sm text-soft">{`${sheet.roleWord}, ${sheet.sizeWords}`}</p>
          <p className="text-sm">
            {[
              `even within ±${sheet.toleranceCents} cents`,
              sheet.relationWords,
              sheet.muffling && `muffling: ${sheet.muffling}`,
            ]
              .filter(Boolean)
              .join('; ')}
          </p>
          {sheet.note && (
            <p>
              <span className="figures text-2xl font-bold">{sheet.note.hz.toFixed(1)} Hz</span> {noteWords(sheet.note)}
            </p>
          )}
          {sheet.figures && (
            <p className="text-sm">
              tap over note{' '}
              <span className="figures">
                {sheet.figures.tapRatio.value.toFixed(2)}
                {sheet.figures.tapRatioMeasured
                  ? ', measured'
                  : `, ${sheet.figures.tapRatio.low.toFixed(2)} to ${sheet.figures.tapRatio.high.toFixed(2)}`}
              </span>
            </p>
          )}
          {batter && <p className="text-sm">Lug order {batter.order.join(', ')}</p>}
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
      <div className="mt-2 grid grid-cols-2 gap-4">
        {sheet.heads.map((head) => (
          <Head key={head.side} head={head} />
        ))}
      </div>
    </article>
  )
}

function noteWords({ name, cents }: SheetNote): string {
  return cents === 0 ? name : `${name} ${cents > 0 ? '+' : '−'}${Math.abs(cents)} cents`
}

function Head({ head }: { head: SheetHead }) {
  const { tap, tensionNPerM } = head
  return (
    <div>
      <p className="font-bold">{head.side === 'batter' ? 'Batter head' : 'Resonant head'}</p>
      <p className="text-sm text-soft">{head.words}</p>
      {tap && (
        <p>
          tap <span className="figures text-xl font-bold">{tap.hz.toFixed(1)} Hz</span>{' '}
          <span className="figures text-sm text-soft">
            {tap.lowHz.toFixed(0)} to {tap.highHz.toFixed(0)}
          </span>
        </p>
      )}
      {tensionNPerM && (
        <p className="text-sm">
          film <span className="figures">{(tensionNPerM.value / 1000).toFixed(2)} kN/m</span>{' '}
          <span className="figures text-soft">
            {(tensionNPerM.low / 1000).toFixed(2)} to {(tensionNPerM.high / 1000).toFixed(2)}
          </span>
        </p>
      )}
      <p className="text-sm">
        {head.gauge === null ? 'no gauge noted' : `gauge ${head.gauge}, relative to this gauge`}
      </p>
      {head.without && <p className="text-sm">{head.without}</p>}
    </div>
  )
}
