import { Hoop } from '@/components/signature/hoop'
import type { SheetHead, TuningSheet } from '@/lib/advance/tuning-sheet'

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
          {batter && <p className="text-sm">Lug order {batter.order.join(', ')}</p>}
        </div>
        <Hoop
          role={sheet.role}
          diameterIn={sheet.diameterIn}
          depthIn={sheet.depthIn}
          lugs={sheet.lugCount}
          name={sheet.name}
          note={batter?.note?.name ?? null}
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

function Head({ head }: { head: SheetHead }) {
  const { note, tap } = head
  return (
    <div>
      <p className="font-bold">{head.side === 'batter' ? 'Batter head' : 'Resonant head'}</p>
      <p className="text-sm text-soft">{head.words}</p>
      {note && (
        <p>
          <span className="figures text-2xl font-bold">{note.hz.toFixed(1)} Hz</span>{' '}
          {note.cents === 0 ? note.name : `${note.name} ${note.cents > 0 ? '+' : '−'}${Math.abs(note.cents)} cents`}
        </p>
      )}
      {tap && (
        <p className="text-sm">
          tap <span className="figures font-bold">{tap.hz.toFixed(0)} Hz</span>, {tap.lowHz.toFixed(0)} to{' '}
          {tap.highHz.toFixed(0)}
        </p>
      )}
      <p className="text-sm">
        {head.gauge === null ? 'no gauge noted' : `gauge ${head.gauge}, relative to this gauge`}
      </p>
      {head.without && <p className="text-sm">{head.without}</p>}
    </div>
  )
}
