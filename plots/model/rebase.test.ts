import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { apply } from './apply'
import { actionArbitrary, documentArbitrary } from './arbitrary'
import type { PlotAction, PlotCommand } from './command'
import { emptyDocument, newPiece, type PlotDocument } from './document'
import { foldCommands } from './fold'
import { emptyHistory, record, redo, undo, type PlotHistory } from './history'
import { fit, rebase } from './rebase'

const command = (action: PlotAction, clientId: string): PlotCommand => ({ ...action, clientId })
const tom = newPiece({ id: 't', kind: 'drum', kitEntryId: 'kit-tom', xM: 1, yM: 1 })
const wedge = newPiece({ id: 'w', kind: 'wedge' })
const base: PlotDocument = { ...emptyDocument, pieces: { t: tom, w: wedge } }

describe('rebasing unsent commands on what others did first', () => {
  /**
   * A server that takes commands in one order, and writers that each hold what they last saw and what they have not
   * sent. Any interleaving of "act" and "sync" must end with everyone on the server's document.
   */
  it('every writer ends on the server’s document, whatever the order', () => {
    const step = fc.record({ who: fc.nat(2), what: fc.option(actionArbitrary, { freq: 3 }) })
    fc.assert(
      fc.property(documentArbitrary, fc.array(step, { maxLength: 25 }), (start, steps) => {
        const log: PlotCommand[] = []
        let server = start
        const writers = [0, 1, 2].map(() => ({ seen: 0, at: start, unsent: [] as PlotCommand[], local: start }))
        const made: string[] = []
        const told: string[] = []
        const sync = (writer: (typeof writers)[number]) => {
          const rebased = rebase(writer.at, log.slice(writer.seen), writer.unsent)
          for (const outcome of rebased.outcomes) told.push(outcome.command.clientId)
          for (const sent of rebased.commands) {
            server = apply(server, sent)
            log.push(sent)
          }
          expect(rebased.document).toEqual(server)
          Object.assign(writer, { seen: log.length, at: server, unsent: [], local: server })
        }
        for (const [index, { who, what }] of steps.entries()) {
          const writer = writers[who]
          if (!writer) continue
          if (what === null) {
            sync(writer)
            continue
          }
          const fitted = fit(writer.local, what)
          if (fitted.action === null) continue
          const clientId = `${who}-${index}`
          made.push(clientId)
          writer.unsent.push(command(fitted.action, clientId))
          writer.local = fitted.document
        }
        writers.forEach(sync)
        writers.forEach(sync)
        for (const writer of writers) expect(writer.local).toEqual(server)
        // Nothing vanishes silently: each command made has an outcome.
        expect([...told].sort()).toEqual([...made].sort())
        const folded = foldCommands(
          { sequence: 0, document: start },
          log.map((entry, index) => ({ sequence: index + 1, command: entry })),
        )
        expect(folded).toEqual({ sequence: log.length, document: server })
      }),
      { numRuns: 300 },
    )
  })

  it('a command on a piece that someone removed is dropped, with the reason', () => {
    const mine = command({ type: 'move', moves: [{ pieceId: 't', xM: 2, yM: 2 }] }, 'mine')
    const rebased = rebase(base, [command({ type: 'remove', pieceIds: ['t'] }, 'theirs')], [mine])
    expect(rebased.commands).toEqual([])
    expect(rebased.outcomes).toEqual([{ command: mine, became: 'dropped', reason: 'piece-not-there' }])
  })

  it('the rest of a command stands when one of its pieces is gone', () => {
    const mine = command(
      {
        type: 'move',
        moves: [
          { pieceId: 't', xM: 2, yM: 2 },
          { pieceId: 'w', xM: 3, yM: 3 },
        ],
      },
      'mine',
    )
    const rebased = rebase(base, [command({ type: 'remove', pieceIds: ['t'] }, 'theirs')], [mine])
    expect(rebased.outcomes.map((outcome) => outcome.became)).toEqual(['trimmed'])
    expect(rebased.document.pieces['w']).toMatchObject({ xM: 3, yM: 3 })
  })

  it('two moves of one piece: the later one shows, and is said to stand over the other', () => {
    const mine = command({ type: 'move', moves: [{ pieceId: 't', xM: 2, yM: 2 }] }, 'mine')
    const theirs = command({ type: 'move', moves: [{ pieceId: 't', xM: -2, yM: 4 }] }, 'theirs')
    const rebased = rebase(base, [theirs], [mine])
    expect(rebased.outcomes.map((outcome) => outcome.became)).toEqual(['kept over'])
    expect(rebased.document.pieces['t']).toMatchObject({ xM: 2, yM: 2 })
  })

  it('different things of one piece both stand', () => {
    const mine = command({ type: 'rotate', turns: [{ pieceId: 't', rotationDeg: 30 }] }, 'mine')
    const theirs = command({ type: 'move', moves: [{ pieceId: 't', xM: -2, yM: 4 }] }, 'theirs')
    const rebased = rebase(base, [theirs], [mine])
    expect(rebased.outcomes.map((outcome) => outcome.became)).toEqual(['kept'])
    expect(rebased.document.pieces['t']).toMatchObject({ xM: -2, yM: 4, rotationDeg: 30 })
  })

  it('a drum that two people place at once stands once', () => {
    const empty = emptyDocument
    const mine = command({ type: 'place', pieces: [{ ...tom, id: 'mine' }] }, 'mine')
    const then = command({ type: 'move', moves: [{ pieceId: 'mine', xM: 5, yM: 5 }] }, 'then')
    const rebased = rebase(empty, [command({ type: 'place', pieces: [tom] }, 'theirs')], [mine, then])
    expect(rebased.outcomes).toMatchObject([
      { became: 'dropped', reason: 'drum-already-placed' },
      { became: 'dropped', reason: 'piece-not-there' },
    ])
    expect(Object.keys(rebased.document.pieces)).toEqual(['t'])
  })

  it('a sending whose answer was lost is known again and not sent twice', () => {
    const mine = command({ type: 'place', pieces: [newPiece({ id: 'n', kind: 'amp' })] }, 'mine')
    const rebased = rebase(base, [mine], [mine])
    expect(rebased.outcomes).toEqual([{ command: mine, became: 'arrived' }])
    expect(rebased.commands).toEqual([])
    expect(rebased.document.pieces['n']).toBeDefined()
  })
})

describe('folding a log', () => {
  it('refuses a gap and a repeat', () => {
    const entry = { sequence: 2, command: command({ type: 'remove', pieceIds: ['w'] }, 'x') }
    expect(() => foldCommands({ sequence: 0, document: base }, [entry])).toThrow(RangeError)
    expect(() => foldCommands({ sequence: 2, document: base }, [entry])).toThrow(RangeError)
    expect(foldCommands({ sequence: 1, document: base }, [entry]).sequence).toBe(2)
  })
})

describe('undo and redo', () => {
  const applyAll = (document: PlotDocument, actions: readonly PlotAction[]) =>
    actions.reduce<PlotDocument>((at, action) => apply(at, action), document)

  it('undoing everything returns to the start, redoing everything to the end', () => {
    fc.assert(
      fc.property(documentArbitrary, fc.array(actionArbitrary, { maxLength: 12 }), (start, actions) => {
        let document = start
        let history: PlotHistory = emptyHistory
        for (const action of actions) {
          const fitted = fit(document, action)
          if (fitted.action === null) continue
          history = record(history, document, [fitted.action])
          document = fitted.document
        }
        const end = document
        for (let step = undo(history, document); step; step = undo(history, document)) {
          document = applyAll(document, step.actions)
          history = step.history
        }
        expect(document).toEqual(start)
        for (let step = redo(history, document); step; step = redo(history, document)) {
          document = applyAll(document, step.actions)
          history = step.history
        }
        expect(document).toEqual(end)
      }),
    )
  })

  it('passes over a step that someone else has made impossible', () => {
    const move: PlotAction = { type: 'move', moves: [{ pieceId: 'w', xM: 9, yM: 9 }] }
    const turn: PlotAction = { type: 'rotate', turns: [{ pieceId: 't', rotationDeg: 90 }] }
    let history = record(emptyHistory, base, [move])
    const moved = apply(base, move)
    history = record(history, moved, [turn])
    const others = apply(apply(moved, turn), { type: 'remove', pieceIds: ['t'] })
    const step = undo(history, others)
    expect(step?.actions).toEqual([{ type: 'move', moves: [{ pieceId: 'w', xM: 0, yM: 0 }] }])
  })

  it('a new step ends what could be redone', () => {
    const move = (xM: number): PlotAction => ({ type: 'move', moves: [{ pieceId: 'w', xM, yM: 0 }] })
    const history = record(emptyHistory, base, [move(1)])
    const step = undo(history, apply(base, move(1)))
    if (!step) throw new Error('there was a step to take back')
    expect(step.history.redo).toHaveLength(1)
    expect(record(step.history, base, [move(2)]).redo).toEqual([])
  })
})
