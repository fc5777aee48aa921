import { Document } from '@react-pdf/renderer'
import type { PackDocument } from '@/lib/advance/pack-document'
import { Cautions } from './cautions'
import { ChannelPage } from './channel-page'
import { CoverPage } from './cover-page'
import { LinePage } from './line-page'
import { PageFrame } from './page-frame'
import { PlotPages } from './plot-pages'
import { SheetPage } from './sheet-page'
import { WhyPage } from './why-page'

export type PackLinks = {
  /** Where the lines are answered; null in a preview. */
  reply: string | null
  /** Where the drums are tuned; null in a preview and for whoever tunes none. */
  bench: string | null
}

/** A pack as a document of pages, in the order in which it is read. */
export function PackPdf({ pack, links }: { pack: PackDocument; links: PackLinks }) {
  const title = `Revision ${pack.revision.number}, ${pack.rig}, for ${pack.recipient.name}`
  // A supplier's pack has its cautions under its lines, not on a page that they would leave bare.
  const endsWithLines = pack.lines.length > 0 && pack.sheets.length === 0
  const workedOut = pack.sheets.filter(({ workedFrom }) => workedFrom !== null)
  return (
    <Document title={title} author={pack.party} creator="Hoopwright" producer="Hoopwright" language={pack.locale}>
      <CoverPage pack={pack} replyLink={links.reply} />
      {pack.plot && <PlotPages pack={pack} plot={pack.plot} />}
      {pack.channels.length > 0 && <ChannelPage pack={pack} />}
      {pack.lines.length > 0 && <LinePage pack={pack} last={endsWithLines} />}
      {pack.sheets.map((sheet) => (
        <SheetPage key={sheet.entryId} pack={pack} sheet={sheet} benchLink={links.bench} />
      ))}
      {workedOut.length > 0 && <WhyPage pack={pack} sheets={workedOut} />}
      {!endsWithLines && (
        <PageFrame pack={pack} title="Cautions">
          <Cautions pack={pack} />
        </PageFrame>
      )}
    </Document>
  )
}
