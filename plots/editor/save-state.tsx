'use client'

import { Button } from '@/components/ui/button'
import { Notice } from '@/components/ui/notice'
import type { PlotNews, PlotSession, PlotSessionState } from '@/lib/client/plot/plot-session'
import type { Piece } from '../model/document'

/** One word on whether the plot is saved. */
export function SaveState({ state }: { state: PlotSessionState }) {
  const words = { saved: 'saved', saving: 'saving', kept: 'not saved yet, kept on this device' }[state.saving]
  return (
    <p role="status" className="figures text-sm text-soft">
      {words}
    </p>
  )
}

/** What went otherwise than the person made it, and what waits for a connection: said until it is read or over. */
export function PlotNotices({
  state,
  session,
  nameOf,
}: {
  state: PlotSessionState
  session: PlotSession
  nameOf: (piece: Piece) => string
}) {
  const sentences = [...new Set(state.news.map((news) => sentenceOf(news, nameOf)))]
  return (
    <>
      {state.saving === 'kept' && (
        <Notice
          kind="wait"
          word="Not saved yet"
          action={<Button onClick={() => session.retryNow()}>Try again now</Button>}
        >
          {state.unsentCount === 1 ? 'One change is' : `${state.unsentCount} changes are`} kept on this device and sent
          as soon as it works. {state.problem}
        </Notice>
      )}
      {sentences.length > 0 && (
        <Notice
          word="Changed meanwhile"
          action={<Button onClick={() => session.dismissNews()}>I have read this</Button>}
        >
          {sentences.join(' ')}
        </Notice>
      )}
    </>
  )
}

const deeds = {
  place: 'placing',
  remove: 'taking off',
  move: 'moving',
  rotate: 'turning',
  edit: 'changing',
  aim: 'aiming',
  setStage: 'resizing the stage',
} as const

function sentenceOf(news: PlotNews, nameOf: (piece: Piece) => string): string {
  switch (news.kind) {
    case 'not kept':
      return 'This device has no room to keep changes: stay on this page until it says “saved”.'
    case 'recovered':
      return `${news.count === 1 ? 'One change' : `${news.count} changes`} left on this device from before ${news.count === 1 ? 'was' : 'were'} put on the plot.`
    case 'refused':
      return `The server did not take ${deeds[news.command.type]} ${whichOf(news.pieces, nameOf)}: ${news.message}.`
    case 'outcome': {
      const who = news.by.length > 0 ? news.by.join(' and ') : 'Someone else'
      const deed = `${deeds[news.outcome.command.type]} ${whichOf(news.pieces, nameOf)}`
      switch (news.outcome.became) {
        case 'kept over':
          return `${who} changed the same as you by ${deed}; yours came later and stands.`
        case 'trimmed':
          return `${who} took some of these off the plot; ${deed} stands for the rest.`
        case 'dropped':
          return news.outcome.reason === 'drum-already-placed'
            ? `${who} had placed ${whichOf(news.pieces, nameOf)} already; it stands where they put it.`
            : `${who} had taken ${whichOf(news.pieces, nameOf)} off the plot, so ${deed} fell away.`
        default:
          return ''
      }
    }
  }
}

function whichOf(pieces: readonly Piece[], nameOf: (piece: Piece) => string): string {
  const [first, second] = pieces
  if (!first) return ''
  if (!second) return nameOf(first)
  return pieces.length === 2
    ? `${nameOf(first)} and ${nameOf(second)}`
    : `${nameOf(first)} and ${pieces.length - 1} more`
}
