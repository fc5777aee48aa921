import type { Route } from 'next'
import Link from 'next/link'
import { Facts } from '@/components/run/facts'
import { ShowHeading } from '@/components/run/show-heading'
import { ShowTimes } from '@/components/run/show-times'
import { StandingBadge } from '@/components/signature/standing-badge'
import { ButtonLink } from '@/components/ui/button-link'
import { Notice } from '@/components/ui/notice'
import { RefreshOnLive } from '@/lib/client/live-provider'
import { stageAccessWords } from '@/lib/contracts/directory'
import { rolesMay } from '@/lib/contracts/permissions'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { readVenue } from '@/lib/server/directory/venues'
import { readParty } from '@/lib/server/party/party-settings'
import { dateWords } from '@/lib/staging/calendar'
import { formatLength } from '@/lib/staging/length'
import { notFound } from 'next/navigation'
import { pageRun } from '../../page-run'
import { runChoices } from '../../run/run-choices'

const utcWords = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', hour: '2-digit', minute: '2-digit', timeZone: 'UTC' })

/** What is true of one show, and where it stands. */
export default async function ShowPage({ params }: PageProps<'/tours/[tourId]/shows/[showId]'>) {
  const { tourId, showId } = await params
  const actor = await pageActor()
  const run = await pageRun(tourId)
  const show = run.days.flatMap((day) => day.shows).find((entry) => entry.id === showId)
  if (!show) notFound()
  const [choices, { venue, stages, contacts }, party] = await pageAnswer(
    Promise.all([runChoices(actor, run), readVenue(actor, show.venueId), readParty(actor)]),
  )
  const stage = stages.find((entry) => entry.id === show.stageId)
  const length = (metres: number) => formatLength(metres, party.units)
  const hires = run.hires.filter((hire) => hire.showIds.includes(show.id))
  const mayEdit = rolesMay(actor.roles, 'show:edit')
  return (
    <main id="main" className="mx-auto max-w-7xl px-4 py-6 sm:px-6">
      <RefreshOnLive topics={[`advance:${showId}`, `bench:${showId}`, `directory:${actor.partyId}`]} />
      <ShowHeading tourId={tourId} show={show} choices={choices.show} mayEdit={mayEdit} />
      {!show.zone && (
        <Notice
          kind="wait"
          className="mt-4"
          action={<ButtonLink href={`/directory/venues/${venue.id}` as Route}>Give the venue its zone</ButtonLink>}
        >
          The zone is not known yet. The times below are what the wall there shows; no deadline can be told from them.
        </Notice>
      )}
      <section aria-labelledby="times" className="mt-6">
        <h2 id="times" className="text-2xl">
          The show
        </h2>
        <Facts
          facts={[
            ['Day', dateWords(show.date)],
            ['Times', <ShowTimes key="times" show={show} />],
            ['Answers due', due(show)],
            ['Rig', <Link key="rig" className="underline underline-offset-4" href={`/tours/${tourId}/kit?rig=${show.rigId}` as Route}>{show.rigName}</Link>],
            ['Player', show.playerName],
            ['Standing', <StandingBadge key="standing" standing={show.standing?.standing ?? 'not sent'} />],
            ['Hire', hires.map((hire) => hire.supplierName).join(', ') || 'none: the venue is asked for what is rented'],
            ['Slot', show.slot ? `${show.slot.changeoverMin} min changeover, ${show.slot.lineCheckMin} min line check` : ''],
            ['Riser parking', show.slot?.riserParking ?? ''],
            ['Shared kit', show.sharedKit ? sharedWords(show.sharedKit) : ''],
          ]}
        />
      </section>
      <section aria-labelledby="stage" className="mt-8">
        <h2 id="stage" className="text-2xl">
          The stage
        </h2>
        <Facts
          facts={[
            ['Venue', <Link key="venue" className="underline underline-offset-4" href={`/directory/venues/${venue.id}` as Route}>{venue.name}</Link>],
            ['Town', [venue.town, venue.country].filter(Boolean).join(', ')],
            ['Stage', show.stageName],
            ['Wide, deep', stage ? `${length(stage.widthM)} by ${length(stage.depthM)}` : ''],
            ['Deck', stage ? (stage.heightM > 0 ? `${length(stage.heightM)} over the floor` : 'the floor itself') : ''],
            ['The way in', stage ? stage.access.map((way) => stageAccessWords[way]).join(', ') || 'not known yet' : ''],
            ['Supply', stage?.volts ? `${stage.volts} V${stage.mainsHz ? `, ${stage.mainsHz} Hz` : ''}` : 'not known yet'],
            ['Inlets', stage?.inlets ?? ''],
            ['Remark', venue.remark],
          ]}
        />
        <p className="mt-2 text-sm text-soft">
          Supply and access are what the venue told you. Have a licensed person check the supply on the day; local rules come first.
        </p>
      </section>
      <section aria-labelledby="people" className="mt-8">
        <h2 id="people" className="text-2xl">
          People there
        </h2>
        {contacts.length === 0 ? (
          <p className="mt-2 text-soft">
            Nobody yet.{' '}
            <Link className="font-bold text-ink underline underline-offset-4" href={`/directory/venues/${venue.id}#contacts` as Route}>
              Add a contact at {venue.name}
            </Link>
            ; a pack is sent to whoever looks after backline.
          </p>
        ) : (
          <Facts facts={contacts.map((contact) => [contact.duties.join(', '), [contact.name, contact.email, contact.phone].filter(Boolean).join(', ')] as const)} />
        )}
      </section>
    </main>
  )
}

function due(show: { answersDue: { date: string; time: string } | null; answersDueAt: string | null }) {
  if (!show.answersDue || !show.answersDueAt) return 'no date set'
  return (
    <>
      {dateWords(show.answersDue.date)}, {show.answersDue.time} there{' '}
      <span className="text-soft">({utcWords.format(new Date(show.answersDueAt))} UTC)</span>
    </>
  )
}

function sharedWords(kit: { owner: string; mayRetune: boolean; maySwap: string }): string {
  return [`of ${kit.owner}`, kit.mayRetune ? 'may be retuned' : 'must not be retuned', kit.maySwap ? `to swap: ${kit.maySwap}` : 'nothing may be swapped'].join('; ')
}
