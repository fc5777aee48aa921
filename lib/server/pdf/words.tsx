import { Text } from '@react-pdf/renderer'
import type { ComponentProps, ReactNode } from 'react'
import { ink } from './ink'
import { families } from './register-fonts'

type Style = Exclude<NonNullable<ComponentProps<typeof Text>['style']>, readonly unknown[] | unknown[]>
type WordsProps = { children: ReactNode; size?: number; colour?: keyof typeof ink; bold?: boolean; style?: Style }

function words(family: keyof typeof families, usual: { size: number; leading: number; bold?: boolean }) {
  return function Words({
    children,
    size = usual.size,
    colour = 'ink',
    bold = usual.bold ?? false,
    style,
  }: WordsProps) {
    const own: Style = {
      fontFamily: families[family],
      fontSize: size,
      fontWeight: bold ? 700 : 400,
      lineHeight: usual.leading,
      color: ink[colour],
    }
    return <Text style={{ ...own, ...style }}>{children}</Text>
  }
}

/** Running text. */
export const Plain = words('text', { size: 9, leading: 1.3 })
/** Names and headings, narrow and heavy. */
export const Heading = words('name', { size: 14, leading: 1.1, bold: true })
/** Numbers that are read off or compared. */
export const Figures = words('figures', { size: 9, leading: 1.25 })
