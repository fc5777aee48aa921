import { Link, View } from '@react-pdf/renderer'
import { ink } from '../ink'
import { mm } from '../paper-measure'
import { QrCode } from '../qr-code'
import { Plain } from '../words'

/** A link as a code to point a phone at, and to press on a screen. Without a link it says that one comes with the sending. */
export function LinkCode({ link, words, sizeMm }: { link: string | null; words: string; sizeMm: number }) {
  return (
    <View style={{ width: mm(sizeMm), alignItems: 'center' }}>
      {link ? (
        <Link src={link}>
          <QrCode link={link} sizeMm={sizeMm} />
        </Link>
      ) : (
        <View
          style={{
            width: mm(sizeMm),
            height: mm(sizeMm),
            border: `0.75pt dashed ${ink.soft}`,
            justifyContent: 'center',
            alignItems: 'center',
            padding: 4,
          }}
        >
          <Plain size={7} colour="soft" style={{ textAlign: 'center' }}>
            Preview: the code of the link stands here once it is sent
          </Plain>
        </View>
      )}
      <Plain size={7.5} style={{ textAlign: 'center', marginTop: 1 }}>
        {words}
      </Plain>
    </View>
  )
}
