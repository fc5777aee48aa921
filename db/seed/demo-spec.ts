import { db } from '@/db/client'
import { createChannel } from '@/lib/server/plots/channels'
import { changeEntry } from '@/lib/server/kit/change-entry'
import { addEntries } from '@/lib/server/kit/add-entries'
import { readKit } from '@/lib/server/kit/read-kit'
import { appendCommands } from '@/lib/server/plots/append-commands'
import { rigPlot } from '@/lib/server/plots/read-plot'
import { issueRevision } from '@/lib/server/revisions/issue-revision'
import { newPiece } from '@/plots/model/document'
import { demoId } from './demo-id'
import type { DemoRig } from './demo-kit'
import { demoEntryId, demoPieceId, demoRigId, demoRigs } from './demo-kit'
import type { Team } from './demo-team'

export const demoRevisionId = (rig: string, number: number) => demoId('revision', rig, String(number))

/** Kit, plot, patch and revisions of both rigs, by the drum tech. */
export async function makeSpec(team: Team): Promise<void> {
  const tech = team['drum-tech']
  for (const rig of demoRigs) {
    const rigId = demoRigId(rig.key)
    await addEntries(tech, {
      rigId,
      entries: rig.things.map((thing) => ({ id: demoEntryId(rig.key, thing.key), entry: thing.entry })),
    })
    await drawPlot(team, rig)
    await makeChannels(team, rig)
  }
  const full = demoRigId('full rig')
  await issueRevision(tech, { rigId: full, id: demoRevisionId('full rig', 1), note: 'First issue for the run.' })
  await changeSpec(team)
  await issueRevision(tech, {
    rigId: full,
    id: demoRevisionId('full rig', 2),
    note: 'The floor tom is now 16 across, 16 deep, since the shallow one would not hold its note; and the rug is a larger one.',
  })
  await issueRevision(tech, {
    rigId: demoRigId('fly rig'),
    id: demoRevisionId('fly rig', 1),
    note: 'Small kit for the two flying days.',
  })
}

/** What the second revision changes: a supplier's drum and a venue's rug. */
async function changeSpec(team: Team): Promise<void> {
  const { entries } = await readKit(team['drum-tech'], { rigId: demoRigId('full rig'), removedToo: false })
  for (const row of entries) {
    if (row.version > 1) continue
    const { id: entryId, rigId: _rig, position: _position, removed: _removed, version, ...entry } = row
    if (entry.kind === 'drum' && entryId === demoEntryId('full rig', 'floor 16')) {
      const insteadOf = { diameterMinIn: 16, diameterMaxIn: 16, depthMinIn: 14, depthMaxIn: 16 }
      await changeEntry(team['drum-tech'], {
        entryId,
        version,
        entry: { ...entry, spec: { ...entry.spec, depthIn: 16, insteadOf } },
      })
    } else if (entryId === demoEntryId('full rig', 'rug')) {
      await changeEntry(team['drum-tech'], { entryId, version, entry: { ...entry, name: 'Rug, 2.4 by 2 m' } })
    }
  }
}

async function drawPlot(team: Team, rig: DemoRig): Promise<void> {
  const placed = rig.things.flatMap((thing) => (thing.at ? [{ ...thing, at: thing.at }] : []))
  const around = [
    { key: 'riser', kind: 'riser', xM: 0, yM: 5 },
    { key: 'wedge', kind: 'wedge', xM: -1.5, yM: 5.3, rotationDeg: 90, label: 'Mix 1' },
    { key: 'bass', kind: 'bass-rig', xM: 2.9, yM: 5.2 },
    { key: 'amp', kind: 'amp', xM: -3, yM: 5.2 },
    { key: 'keys', kind: 'keys', xM: 3.3, yM: 2.6, rotationDeg: 340 },
    { key: 'playback', kind: 'playback', xM: -1.9, yM: 6.1 },
    { key: 'box', kind: 'stage-box', xM: 1.7, yM: 6.3, label: 'Box A' },
    { key: 'power', kind: 'power-drop', xM: -1.7, yM: 4.1 },
    { key: 'voice', kind: 'person', xM: 0, yM: 1.2, label: 'Voice' },
  ]
  const { sequence } = await rigPlot(db(), { partyId: team.owner.partyId }, demoRigId(rig.key))
  // The log knows these commands by their ids: drawing again adds nothing.
  await appendCommands(team['drum-tech'], {
    rigId: demoRigId(rig.key),
    baseSequence: sequence,
    commands: [
      {
        type: 'place',
        clientId: demoId('command', rig.key, 'around'),
        pieces: around.map(({ key, ...piece }) => newPiece({ id: demoPieceId(rig.key, key), ...piece })),
      },
      {
        type: 'place',
        clientId: demoId('command', rig.key, 'kit'),
        pieces: placed.map(({ key, entry, at, aimsAt }) =>
          newPiece({
            id: demoPieceId(rig.key, key),
            kind: entry.kind,
            kitEntryId: demoEntryId(rig.key, key),
            ...at,
            aim: aimsAt ? { pieceId: demoPieceId(rig.key, aimsAt) } : null,
          }),
        ),
      },
    ],
  })
}

async function makeChannels(team: Team, rig: DemoRig): Promise<void> {
  const heard = rig.things.flatMap(({ key, entry, channel }) =>
    channel && entry.kind === 'microphone' ? [{ key, name: entry.name, number: channel, spec: entry.spec }] : [],
  )
  const microphones = heard.map(({ key, name, number, spec }) => ({
    ...{ key, number, name, output: 'mic', phantom: spec.phantom },
    stand: spec.stand === 'none' ? '' : spec.stand,
  }))
  const others = [
    { key: 'bass', name: 'Bass', output: 'di', phantom: false, stand: '' },
    { key: 'keys', name: 'Keys L', output: 'L', phantom: false, stand: '' },
    { key: 'keys', name: 'Keys R', output: 'R', phantom: false, stand: '' },
    { key: 'playback', name: 'Click', output: 'click', phantom: false, stand: '' },
  ].map((channel, index) => ({ ...channel, number: 10 + index }))
  for (const { key, ...channel } of [...microphones, ...others]) {
    await createChannel(team['drum-tech'], {
      rigId: demoRigId(rig.key),
      id: demoId('channel', rig.key, String(channel.number)),
      channel: { ...channel, pieceId: demoPieceId(rig.key, key) },
    })
  }
}
