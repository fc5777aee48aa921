import { describe, expect, it } from 'vitest'
import type { Channel } from '@/lib/contracts/channel'
import { channelDefaults, emptyDocument, newPiece } from '@/plots/index'
import type { KitById, PlotDocument } from '@/plots/index'
import { outputChoices, takenWords } from './output-choices'

const kit: KitById = new Map([
  [
    'k',
    {
      kind: 'drum',
      id: 'k',
      name: 'Kick 22',
      role: 'kick',
      diameterIn: 22,
      depthIn: 16,
      lugs: 8,
      noteLabel: null,
      noteHz: null,
    },
  ],
  ['m', { kind: 'microphone', id: 'm', name: 'Boundary', type: 'boundary', phantom: true, stand: 'none', count: 2 }],
])
const document: PlotDocument = {
  ...emptyDocument,
  pieces: {
    kick: newPiece({ id: 'kick', kind: 'drum', kitEntryId: 'k' }),
    mic: newPiece({ id: 'mic', kind: 'microphone', kitEntryId: 'm', aim: { pieceId: 'kick' } }),
    play: newPiece({ id: 'play', kind: 'playback' }),
  },
}
const channel = (pieceId: string | null, output: string): Channel => ({
  ...{ id: 'c', rigId: 'r', number: 1, name: '', stand: '', phantom: false, version: 1 },
  pieceId,
  output,
})

describe('what a channel can take', () => {
  it('is every output of every piece, a microphone named by what it hears', () => {
    expect(outputChoices(document, kit).map((choice) => choice.label)).toEqual([
      'Boundary on Kick 22',
      'Playback rack, click',
      'Playback rack, L',
      'Playback rack, R',
    ])
  })

  it('comes in the usual order: drums before playback', () => {
    const [first] = outputChoices(document, kit).sort((a, b) => a.rank - b.rank)
    expect(first?.pieceId).toBe('mic')
  })

  it('is said in words, also when its piece is gone', () => {
    expect(takenWords(document, kit, channel('mic', 'mic'))).toBe('Boundary on Kick 22')
    expect(takenWords(document, kit, channel(null, ''))).toBe('nothing yet')
    expect(takenWords(document, kit, channel('nobody', 'mic'))).toBe('a piece that is gone from the plot')
  })

  it('starts a channel with the drum’s name and the microphone’s phantom', () => {
    const { mic, play } = document.pieces
    if (!mic || !play) throw new Error('both are on the plot')
    expect(channelDefaults(document, kit, mic, 'mic')).toEqual({ name: 'Kick 22', stand: '', phantom: true })
    expect(channelDefaults(document, kit, play, 'click')).toEqual({
      name: 'Playback rack click',
      stand: '',
      phantom: false,
    })
  })
})
