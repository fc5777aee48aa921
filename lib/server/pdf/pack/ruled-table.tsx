import { View } from '@react-pdf/renderer'
import type { ReactNode } from 'react'
import { ink } from '../ink'
import { mm } from '../paper-measure'
import { Plain } from '../words'

export interface Column {
  readonly head: string
  /** Millimetres, or null to take what is left. */
  readonly widthMm: number | null
  readonly align?: 'left' | 'center' | 'right'
}

const alignment = { left: 'flex-start', center: 'center', right: 'flex-end' } as const

/** Rows between hairlines under a head that comes again on each page; a row is never broken. */
export function RuledTable({
  columns,
  rows,
}: {
  columns: readonly Column[]
  rows: readonly { key: string; cells: readonly ReactNode[] }[]
}) {
  return (
    <View>
      <View fixed style={{ flexDirection: 'row', borderBottom: `1pt solid ${ink.ink}`, paddingBottom: 2 }}>
        {columns.map((column, index) => (
          <Cell key={index} column={column}>
            <Plain size={8} bold style={{ textAlign: column.align ?? 'left' }}>
              {column.head}
            </Plain>
          </Cell>
        ))}
      </View>
      {rows.map(({ key, cells }) => (
        <View
          key={key}
          wrap={false}
          style={{ flexDirection: 'row', borderBottom: `0.4pt solid ${ink.soft}`, paddingVertical: 3 }}
        >
          {columns.map((column, index) => (
            <Cell key={index} column={column}>
              {cells[index]}
            </Cell>
          ))}
        </View>
      ))}
    </View>
  )
}

function Cell({ column, children }: { column: Column; children: ReactNode }) {
  return (
    <View
      style={{
        paddingRight: 4,
        alignItems: alignment[column.align ?? 'left'],
        ...(column.widthMm === null ? { flex: 1 } : { width: mm(column.widthMm) }),
      }}
    >
      {children}
    </View>
  )
}
