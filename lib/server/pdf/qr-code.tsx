import { Path, Svg } from '@react-pdf/renderer'
import QRCode from 'qrcode'
import { ink } from './ink'
import { mm } from './paper-measure'

/** Blank modules round a code that a reader needs: ISO/IEC 18004 asks four. */
const quietModules = 4

/** A QR code as one filled path, so that it prints sharp at any size. `sizeMm` includes the quiet edge. */
export function QrCode({ link, sizeMm }: { link: string; sizeMm: number }) {
  const { modules } = QRCode.create(link, { errorCorrectionLevel: 'M' })
  const across = modules.size + 2 * quietModules
  const side = mm(sizeMm) / across
  const dark: string[] = []
  for (let row = 0; row < modules.size; row++) {
    for (let column = 0; column < modules.size; column++) {
      if (!modules.get(row, column)) continue
      const x = (column + quietModules) * side
      const y = (row + quietModules) * side
      dark.push(`M${x} ${y}h${side}v${side}h${-side}z`)
    }
  }
  return (
    <Svg width={mm(sizeMm)} height={mm(sizeMm)}>
      <Path d={dark.join('')} fill={ink.ink} />
    </Svg>
  )
}
