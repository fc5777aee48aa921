import { View } from '@react-pdf/renderer'
import { planningCaution } from '@/lib/advance/cautions'
import type { PackDocument } from '@/lib/advance/pack-document'
import { ink } from '../ink'
import { mm } from '../paper-measure'
import { Heading, Plain } from '../words'

/** The cautions that belong to what the pack asks for. */
export function Cautions({ pack }: { pack: PackDocument }) {
  return (
    <>
      {pack.cautions.map(({ name, words }) => (
        <View
          key={name}
          wrap={false}
          style={{ marginBottom: mm(4), borderLeft: `3pt solid ${ink.ink}`, paddingLeft: 8 }}
        >
          <Heading size={13}>{name}</Heading>
          <Plain size={10}>{words}</Plain>
        </View>
      ))}
      <Plain size={10} bold>
        {planningCaution}
      </Plain>
    </>
  )
}
