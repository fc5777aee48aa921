import { Text } from '@react-pdf/renderer'
import { ink } from '../ink'
import { families } from '../register-fonts'

/**
 * "Page 3 of 9", filled in once the pages are known. It sets no line height: the writer lays such words out twice and would
 * multiply it twice, which pushes the whole foot off the page.
 */
export function PageNumber() {
  return (
    <Text
      style={{ fontFamily: families.text, fontSize: 8, color: ink.ink }}
      render={({ pageNumber, totalPages }) => `Page ${pageNumber} of ${totalPages}`}
    />
  )
}
