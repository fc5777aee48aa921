import type { LineContent } from '@/lib/advance/line-content'
import type { ReplyLine } from '@/lib/contracts/answer'

/** The sizes that were asked for, to begin an "instead" from; null of what has none. */
export function lineSize(content: LineContent): ReplyLine['size'] {
  switch (content.kind) {
    case 'drum':
      return { diameterIn: content.spec.diameterIn, depthIn: content.spec.depthIn, lugs: content.spec.lugs }
    case 'cymbal':
      return { diameterIn: content.spec.diameterIn, depthIn: null, lugs: null }
    case 'hardware':
    case 'microphone':
      return null
  }
}
