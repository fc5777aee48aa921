import type { Metadata } from 'next'
import { AddPlayer, PlayerTools } from '@/components/directory/player-tools'
import { ListTools } from '@/components/list/list-tools'
import { Pages } from '@/components/list/pages'
import { SortHead } from '@/components/list/sort-head'
import { EmptyState } from '@/components/ui/empty-state'
import { Table, TableCell, TableHead, TableRow } from '@/components/ui/table'
import { rolesMay } from '@/lib/contracts/permissions'
import { playerListQuery } from '@/lib/contracts/player'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { readParty } from '@/lib/server/party/party-settings'
import { readPlayers } from '@/lib/server/players/players'
import { formatLength } from '@/lib/staging/length'

export const metadata: Metadata = { title: 'Players' }

const path = '/directory/players'
const filters = [
  { value: 'all', label: 'every player' },
  { value: 'right', label: 'right-handed' },
  { value: 'left', label: 'left-handed' },
]

export default async function PlayersPage({ searchParams }: PageProps<'/directory/players'>) {
  const actor = await pageActor()
  const query = playerListQuery.parse(await searchParams)
  const [{ rows, total }, { units }] = await pageAnswer(Promise.all([readPlayers(actor, query), readParty(actor)]))
  const mayEdit = rolesMay(actor.roles, 'player:edit')
  const nothingYet = total === 0 && query.q === '' && query.filter === 'all'
  return (
    <>
      <h1 className="text-4xl">Players</h1>
      <div className="mt-6 flex flex-col items-start gap-4">
        {nothingYet && (
          <EmptyState title="No player yet">
            {mayEdit
              ? 'Add who sits behind the kit: a left-hander has the hats on the other side, and every show names its player.'
              : 'The drum tech or the tour manager adds who sits behind the kit.'}
          </EmptyState>
        )}
        {mayEdit && <AddPlayer units={units} first={nothingYet} />}
        {!nothingYet && <ListTools path={path} query={query} searched="Name" filters={filters} />}
      </div>
      {!nothingYet && rows.length === 0 && (
        <p className="mt-6 text-soft">No player is like that. Show all, or look for a part of the name.</p>
      )}
      {rows.length > 0 && (
        <Table
          caption="Players"
          captionHidden
          className="mt-4"
          head={
            <>
              <SortHead path={path} query={query} by="name">
                Name
              </SortHead>
              <SortHead path={path} query={query} by="hand">
                Hand
              </SortHead>
              <TableHead numeric>Throne height</TableHead>
              {mayEdit && <TableHead>Change</TableHead>}
            </>
          }
        >
          {rows.map((player) => (
            <TableRow key={player.id}>
              <TableCell className="name text-lg">{player.name}</TableCell>
              <TableCell>{player.hand}-handed</TableCell>
              <TableCell numeric>
                {player.throneHeightM === null ? 'not known yet' : formatLength(player.throneHeightM, units)}
              </TableCell>
              {mayEdit && (
                <TableCell>
                  <PlayerTools player={player} units={units} />
                </TableCell>
              )}
            </TableRow>
          ))}
        </Table>
      )}
      {!nothingYet && <Pages path={path} query={query} total={total} words={['player', 'players']} />}
    </>
  )
}
