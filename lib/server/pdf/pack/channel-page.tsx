import { View } from '@react-pdf/renderer'
import type { PackDocument } from '@/lib/advance/pack-document'
import { mm } from '../paper-measure'
import { Figures, Plain } from '../words'
import { PageFrame } from './page-frame'
import { RuledTable } from './ruled-table'

/** The channel list: what each channel takes, on which stand, and whether it needs phantom. */
export function ChannelPage({ pack }: { pack: PackDocument }) {
  const phantom = pack.channels.filter((channel) => channel.phantom).length
  return (
    <PageFrame pack={pack} title="Channel list">
      <View style={{ marginBottom: mm(2) }}>
        <Plain>
          {`${pack.channels.length === 1 ? '1 channel' : `${pack.channels.length} channels`}, ${phantom} with phantom. P48 is 48 ± 4 V, at most 10 mA an input (IEC 61938).`}
        </Plain>
      </View>
      <RuledTable
        columns={[
          { head: 'Ch', widthMm: 12, align: 'right' },
          { head: 'Name', widthMm: 48 },
          { head: 'Takes', widthMm: null },
          { head: 'Stand', widthMm: 30 },
          { head: 'Phantom', widthMm: 20 },
          { head: 'Box and socket', widthMm: 30 },
        ]}
        rows={pack.channels.map(({ number, name, source, stand, phantom: powered }) => ({
          key: String(number),
          cells: [
            <Figures key="number" bold>
              {String(number)}
            </Figures>,
            <Plain key="name" bold>
              {name}
            </Plain>,
            <Plain key="source">{source === '' ? 'not on the plot yet' : source}</Plain>,
            <Plain key="stand">{stand === '' ? '–' : stand}</Plain>,
            <Plain key="phantom">{powered ? '48 V' : '–'}</Plain>,
            null,
          ],
        }))}
      />
    </PageFrame>
  )
}
