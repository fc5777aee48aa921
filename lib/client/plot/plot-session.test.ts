import { describe, expect, it } from 'vitest'
import type { MissedCommand } from '@/lib/contracts/plot'
import { AppError } from '@/lib/errors'
import { apply } from '@/plots/model/apply'
import type { PlotAction, PlotCommand } from '@/plots/model/command'
import { emptyDocument, newPiece } from '@/plots/model/document'
import { foldCommands } from '@/plots/model/fold'
import { PlotCommandError } from '@/plots/model/plot-command-error'
import { createPlotSession, type PlotSession } from './plot-session'
import type { PlotServer } from './plot-server'
import type { Unsent, UnsentStore } from './unsent-store'

const rigId = '6f1c2c1e-0000-4000-8000-000000000001'

/** A server that keeps the log as the real one does, and can be cut off before or after it takes a sending. */
function fakeServer() {
  const log: MissedCommand[] = []
  const cut = { before: false, after: false }
  const fold = () => foldCommands({ sequence: 0, document: emptyDocument }, log)
  const lost = () => new AppError('unavailable', 'No connection. What you typed is kept here; it is not saved yet.')
  const take = (commands: readonly PlotCommand[], by: string) => {
    let { document } = fold()
    for (const [index, command] of commands.entries()) {
      try {
        document = apply(document, command)
      } catch (error) {
        if (!(error instanceof PlotCommandError)) throw error
        throw new AppError('invalid', error.message, { details: { fields: { [`commands.${index}`]: error.message } } })
      }
    }
    for (const command of commands) log.push({ sequence: log.length + 1, command, by })
  }
  const server: PlotServer = {
    async read() {
      if (cut.before) throw lost()
      return { rigId, ...fold() }
    },
    async missed(after) {
      if (cut.before) throw lost()
      return { sequence: log.length, missed: log.slice(after) }
    },
    async append(baseSequence, commands) {
      if (cut.before) throw lost()
      const fresh = commands.filter((command) => !log.some((entry) => entry.command.clientId === command.clientId))
      if (fresh.length > 0) {
        if (baseSequence !== log.length)
          throw new AppError('stale', 'moved on', {
            details: { sequence: log.length, missed: log.slice(baseSequence) },
          })
        take(fresh, 'us')
      }
      if (cut.after) throw lost()
      return { sequence: log.length }
    },
  }
  return {
    server,
    log,
    cut,
    document: () => fold().document,
    others: (action: PlotAction) => take([{ ...action, clientId: crypto.randomUUID() }], 'Ana'),
  }
}

function memoryStore(device: Map<string, Unsent>, page: string): UnsentStore {
  return {
    keep(unsent) {
      if (unsent.commands.length > 0) device.set(page, structuredClone(unsent))
      else device.delete(page)
      return true
    },
    async takeOver() {
      const taken = [...device.keys()].filter((key) => key !== page)
      return {
        left: taken.map((key) => device.get(key)).filter((unsent) => unsent !== undefined),
        clear: () => taken.forEach((key) => device.delete(key)),
      }
    },
  }
}

function open(server: PlotServer, device = new Map<string, Unsent>(), page = 'page') {
  const timers: (() => void)[] = []
  const session = createPlotSession({
    initial: { rigId, sequence: 0, document: emptyDocument },
    server,
    store: memoryStore(device, page),
    newId: () => crypto.randomUUID(),
    later: (run) => {
      timers.push(run)
      return () => void timers.splice(timers.indexOf(run), 1)
    },
  })
  return { session, device, timers }
}

/** Waits until the session has no sending under way. */
async function idle(session: PlotSession) {
  for (let turn = 0; turn < 50 && session.read().saving === 'saving'; turn += 1) await Promise.resolve()
}

/** The same, and has heard what others did. */
async function settled(session: PlotSession) {
  await idle(session)
  await session.catchUp().catch(() => undefined)
}

const id = (last: string) => `6f1c2c1e-0000-4000-8000-0000000000${last}`
const placeAmp: PlotAction = { type: 'place', pieces: [newPiece({ id: id('a1'), kind: 'amp' })] }
const moveAmp = (xM: number): PlotAction => ({ type: 'move', moves: [{ pieceId: id('a1'), xM, yM: 1 }] })

describe('a plot in hand', () => {
  it('shows a step at once and saves it', async () => {
    const fake = fakeServer()
    const { session, device } = open(fake.server)
    expect(session.act([placeAmp])).toBeNull()
    expect(session.read().document.pieces[id('a1')]).toBeDefined()
    await settled(session)
    expect(session.read()).toMatchObject({ saving: 'saved', unsentCount: 0, problem: null })
    expect(fake.document()).toEqual(session.read().document)
    expect(device.size).toBe(0)
  })

  it('refuses what cannot be, and changes nothing', () => {
    const { session } = open(fakeServer().server)
    expect(session.act([moveAmp(1)])?.code).toBe('piece-not-there')
    expect(session.read()).toMatchObject({ unsentCount: 0, canUndo: false })
  })

  it('keeps steps on the device while there is no connection, says so, and saves them when it is back', async () => {
    const fake = fakeServer()
    const { session, device, timers } = open(fake.server)
    fake.cut.before = true
    session.act([placeAmp])
    session.act([moveAmp(3)])
    await settled(session)
    expect(session.read()).toMatchObject({
      saving: 'kept',
      unsentCount: 2,
      problem: expect.stringContaining('No connection'),
    })
    expect(device.get('page')?.commands).toHaveLength(2)
    expect(timers.length).toBeGreaterThan(0)
    fake.cut.before = false
    session.retryNow()
    await settled(session)
    expect(session.read()).toMatchObject({ saving: 'saved', unsentCount: 0 })
    expect(fake.document().pieces[id('a1')]).toMatchObject({ xM: 3 })
  })

  it('does not do a step twice when only the answer was lost', async () => {
    const fake = fakeServer()
    const { session } = open(fake.server)
    fake.cut.after = true
    session.act([placeAmp])
    await settled(session)
    fake.cut.after = false
    session.retryNow()
    await settled(session)
    expect(fake.log).toHaveLength(1)
    expect(session.read()).toMatchObject({ saving: 'saved', unsentCount: 0, news: [] })
  })

  it('puts its steps on top of what others did meanwhile', async () => {
    const fake = fakeServer()
    fake.others(placeAmp)
    const { session } = open(fake.server)
    await session.catchUp()
    fake.others({ type: 'rotate', turns: [{ pieceId: id('a1'), rotationDeg: 45 }] })
    session.act([moveAmp(4)])
    await settled(session)
    expect(fake.document().pieces[id('a1')]).toMatchObject({ xM: 4, rotationDeg: 45 })
    expect(session.read().document).toEqual(fake.document())
  })

  it('tells when a step fell away because someone removed the piece', async () => {
    const fake = fakeServer()
    fake.others(placeAmp)
    const { session } = open(fake.server)
    await session.catchUp()
    fake.others({ type: 'remove', pieceIds: [id('a1')] })
    session.act([moveAmp(4)])
    await settled(session)
    expect(session.read().news).toMatchObject([
      { kind: 'outcome', by: ['Ana'], outcome: { became: 'dropped', reason: 'piece-not-there' } },
    ])
    session.dismissNews()
    expect(session.read().news).toEqual([])
  })

  it('lets go of a step the server refuses, tells why, and saves the rest', async () => {
    const fake = fakeServer()
    const refusing: PlotServer = {
      ...fake.server,
      append(baseSequence, commands) {
        const index = commands.findIndex((command) => command.type === 'place' && command.pieces[0]?.kind === 'wedge')
        if (index >= 0)
          return Promise.reject(
            new AppError('invalid', 'no', {
              details: { fields: { [`commands.${index}`]: 'The kit of this rig has no such entry' } },
            }),
          )
        return fake.server.append(baseSequence, commands)
      },
    }
    const { session } = open(refusing)
    session.act([placeAmp])
    session.act([{ type: 'place', pieces: [newPiece({ id: id('b2'), kind: 'wedge' })] }])
    session.act([moveAmp(2)])
    await settled(session)
    expect(session.read().news).toMatchObject([{ kind: 'refused', message: 'The kit of this rig has no such entry' }])
    expect(Object.keys(fake.document().pieces)).toEqual([id('a1')])
    expect(fake.document().pieces[id('a1')]).toMatchObject({ xM: 2 })
    expect(session.read()).toMatchObject({ saving: 'saved', unsentCount: 0 })
  })

  it('takes over what a closed page left on the device, and not what had arrived', async () => {
    const fake = fakeServer()
    const device = new Map<string, Unsent>()
    const first = open(fake.server, device, 'first')
    first.session.act([placeAmp])
    await settled(first.session)
    fake.cut.after = true
    first.session.act([moveAmp(2)])
    await idle(first.session)
    fake.cut.before = true
    first.session.act([moveAmp(7)])
    await idle(first.session)
    first.session.stop()
    expect(device.get('first')?.commands).toHaveLength(2)

    fake.cut.before = fake.cut.after = false
    const second = open(fake.server, device, 'second')
    await second.session.catchUp()
    await second.session.start()
    await settled(second.session)
    expect(second.session.read().news).toEqual([{ kind: 'recovered', count: 1 }])
    expect(fake.document().pieces[id('a1')]).toMatchObject({ xM: 7 })
    expect(fake.log).toHaveLength(3)
    expect(device.size).toBe(0)
  })

  it('undoes and redoes its own steps, as commands that others see', async () => {
    const fake = fakeServer()
    const { session } = open(fake.server)
    session.act([placeAmp])
    session.act([moveAmp(5)])
    expect(session.undo()).toBe(true)
    expect(session.read().document.pieces[id('a1')]).toMatchObject({ xM: 0 })
    expect(session.redo()).toBe(true)
    await settled(session)
    expect(fake.document().pieces[id('a1')]).toMatchObject({ xM: 5 })
    session.undo()
    session.undo()
    expect(session.undo()).toBe(false)
    await settled(session)
    expect(fake.document().pieces).toEqual({})
  })
})
