import type { ReactNode } from 'react'
import { Facts } from '@/components/run/facts'
import { Table, TableCell, TableHead, TableRow } from '@/components/ui/table'
import { planningCaution } from '@/lib/advance/cautions'
import type { PackDocument } from '@/lib/advance/pack-document'
import { AskedLines } from './asked-lines'
import { PackPlotDrawing } from './pack-plot-drawing'
import { PackSheet } from './pack-sheet'

/** A pack as a page: the same words and drawings as its PDF. */
export function PackView({ pack }: { pack: PackDocument }) {
  return (
    <div className="flex flex-col gap-10">
      <Part title={pack.shows.length === 1 ? 'Show' : `${pack.shows.length} shows`}>
        <Facts
          facts={[
            ...pack.shows.map(
              (show) =>
                [
                  show.date,
                  [show.title, ...show.times.map(({ label, words }) => `${label.toLowerCase()} ${words}`)].join('; '),
                ] as const,
            ),
            ['Answers due', pack.answersDue],
            ...pack.facts.map(({ label, words }) => [label, words] as const),
          ]}
        />
      </Part>
      {pack.changed && (
        <Part title={`Changed since revision ${pack.changed.sinceRevision}`}>
          {pack.changed.sentences.length === 0 ? (
            <p className="mt-2 text-soft">Nothing that concerns this reader.</p>
          ) : (
            <ul className="mt-2 list-none border-l-4 border-plum pl-3">
              {pack.changed.sentences.map((sentence) => (
                <li key={sentence}>{sentence}</li>
              ))}
            </ul>
          )}
        </Part>
      )}
      {pack.contacts.length > 0 && (
        <Part title="Contacts this reader sees">
          <Facts
            facts={pack.contacts.map(
              (contact) =>
                [contact.name, [contact.duty, contact.email, contact.phone].filter(Boolean).join(', ')] as const,
            )}
          />
        </Part>
      )}
      {pack.plot && (
        <Part title="Plot">
          <PackPlotDrawing plot={pack.plot} units={pack.units} />
        </Part>
      )}
      {pack.channels.length > 0 && (
        <Part title="Channel list">
          <Channels pack={pack} />
        </Part>
      )}
      <Part title="Lines">
        <AskedLines
          caption="The numbered lines"
          lines={pack.lines.map((line) => ({
            ...line,
            by: line.asked ? `${pack.recipient.name}: asked` : `${line.broughtBy}: told only`,
          }))}
        />
      </Part>
      {pack.sheets.length > 0 && (
        <Part title="Tuning sheets">
          <div className="mt-2 grid gap-6 lg:grid-cols-2">
            {pack.sheets.map((sheet) => (
              <PackSheet key={sheet.entryId} sheet={sheet} />
            ))}
          </div>
        </Part>
      )}
      <Part title="Cautions">
        <Facts facts={pack.cautions.map(({ name, words }) => [name, words] as const)} />
        <p className="mt-2 text-sm text-soft">{planningCaution}</p>
      </Part>
    </div>
  )
}

function Part({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section aria-label={title}>
      <h2 className="text-2xl">{title}</h2>
      {children}
    </section>
  )
}

function Channels({ pack }: { pack: PackDocument }) {
  return (
    <Table
      caption="Channels"
      captionHidden
      head={
        <>
          <TableHead numeric>Ch</TableHead>
          <TableHead>Name</TableHead>
          <TableHead>Takes</TableHead>
          <TableHead>Stand</TableHead>
          <TableHead>Phantom</TableHead>
        </>
      }
    >
      {pack.channels.map((channel) => (
        <TableRow key={channel.number}>
          <TableCell numeric className="font-bold">
            {channel.number}
          </TableCell>
          <TableCell className="font-bold">{channel.name}</TableCell>
          <TableCell>{channel.source || 'not on the plot yet'}</TableCell>
          <TableCell>{channel.stand || '–'}</TableCell>
          <TableCell>{channel.phantom ? '48 V' : '–'}</TableCell>
        </TableRow>
      ))}
    </Table>
  )
}
