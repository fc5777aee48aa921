import { Page, View } from '@react-pdf/renderer'
import type { ReactNode } from 'react'
import type { PackDocument } from '@/lib/advance/pack-document'
import { ink } from '../ink'
import { marginMm, mm } from '../paper-measure'
import { families } from '../register-fonts'
import { Heading, Plain } from '../words'
import { PageNumber } from './page-number'

export type FrameProps = {
  pack: PackDocument
  title: string
  orientation?: 'portrait' | 'landscape'
  children: ReactNode
}

/** Head and foot are one line each: a name too long for its share of it ends in an ellipsis. */
function capped(text: string, most: number): string {
  const signs = Array.from(text)
  return signs.length > most ? `${signs.slice(0, most - 1).join('')}…` : text
}

/** A page of a pack: whose it is and which revision at the head, for whom and which page at the foot. */
export function PageFrame({ pack, title, orientation = 'portrait', children }: FrameProps) {
  const edge = { position: 'absolute' as const, left: mm(marginMm.side), right: mm(marginMm.side) }
  const row = { flexDirection: 'row' as const, justifyContent: 'space-between' as const }
  return (
    <Page
      size={pack.paper === 'A4' ? 'A4' : 'LETTER'}
      orientation={orientation}
      style={{
        fontFamily: families.text,
        backgroundColor: ink.sheet,
        paddingTop: mm(marginMm.top),
        paddingBottom: mm(marginMm.bottom),
        paddingHorizontal: mm(marginMm.side),
      }}
    >
      <View
        fixed
        style={{
          ...edge,
          ...row,
          top: mm(7),
          alignItems: 'flex-end',
          paddingBottom: 2,
          borderBottom: `0.75pt solid ${ink.ink}`,
        }}
      >
        <Heading size={10}>{capped(title, 60)}</Heading>
        <Plain size={8}>{capped(`${pack.party}, ${pack.tour}`, 64)}</Plain>
      </View>
      {children}
      <View
        fixed
        style={{
          ...edge,
          ...row,
          bottom: mm(5.5),
          alignItems: 'flex-start',
          paddingTop: 2,
          borderTop: `0.5pt solid ${ink.ink}`,
        }}
      >
        <Plain size={8}>{capped(`Revision ${pack.revision.number}, ${pack.rig}`, 44)}</Plain>
        <Plain size={8}>{capped(`For ${pack.recipient.name}`, 44)}</Plain>
        <PageNumber />
      </View>
    </Page>
  )
}
