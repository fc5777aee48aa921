import { View } from '@react-pdf/renderer'
import type { Fact } from '@/lib/advance/pack-document'
import { ink } from '../ink'
import { mm } from '../paper-measure'
import { Plain } from '../words'

/** Labels and their words, a hairline between. */
export function FactList({ facts, labelMm = 34 }: { facts: readonly Fact[]; labelMm?: number }) {
  return (
    <View>
      {facts.map(({ label, words }, index) => (
        <View
          key={index}
          wrap={false}
          style={{ flexDirection: 'row', paddingVertical: 2, borderBottom: `0.4pt solid ${ink.line}` }}
        >
          <View style={{ width: mm(labelMm) }}>
            <Plain colour="soft">{label}</Plain>
          </View>
          <View style={{ flex: 1 }}>
            <Plain>{words}</Plain>
          </View>
        </View>
      ))}
    </View>
  )
}
