import type { Route } from 'next'
import type { NextKind, NextStep } from '@/lib/advance/next-up'
import type { Run } from '@/lib/server/tours/read-run'

export interface NextLink {
  key: string
  about: string
  /** Why it is here, in the words of the trade. */
  why: string
  /** The words of the one button that does it. */
  action: string
  href: Route
}

const why: Record<NextKind, string> = {
  'add days': 'It has no days yet.',
  'add a show': 'No show is on it yet.',
  'start the kit': 'Its kit is empty.',
  issue: 'Nothing was issued yet, so nothing can be sent.',
  'give the zone': 'The zone is not known yet; deadlines cannot be told.',
  'add a contact': 'Nobody there to write to.',
  send: 'Not sent.',
  'send again': 'The mail was not delivered.',
  'take down': 'The answer is overdue.',
  'send what changed': 'The spec has changed since it was sent.',
  settle: 'Answered; what differs waits for you.',
}

const action: Record<NextKind, string> = {
  'add days': 'Add the days',
  'add a show': 'Put a show on a day',
  'start the kit': 'Put the first drum in the kit',
  issue: 'Issue revision 1',
  'give the zone': 'Give the zone',
  'add a contact': 'Add a contact',
  send: 'Send the pack',
  'send again': 'Send it again',
  'take down': 'Take the answer down',
  'send what changed': 'Send what changed',
  settle: 'Settle the answer',
}

/** Each step with the page where its button does it. */
export function nextLinks(run: Run, steps: readonly NextStep[]): NextLink[] {
  const base = `/tours/${run.tour.id}`
  const shows = run.days.flatMap((day) => day.shows)
  const place = (step: NextStep): string => {
    const show = shows.find(({ id }) => id === step.showId)
    const hire = run.hires.find(({ id }) => id === step.hireId)
    switch (step.kind) {
      case 'add days':
      case 'add a show':
        return `${base}/run#days`
      case 'start the kit':
        return `${base}/kit?rig=${step.rigId}`
      case 'issue':
        return `${base}/revisions?rig=${step.rigId}`
      case 'give the zone':
        return `/directory/venues/${show?.venueId}`
      case 'add a contact':
        return show ? `/directory/venues/${show.venueId}#contacts` : `/directory/suppliers/${hire?.supplierId}#contacts`
      default:
        return show ? `${base}/shows/${show.id}/advance` : `${base}/hires/${step.hireId}/advance`
    }
  }
  return steps.map((step) => ({
    key: step.key,
    about: step.about,
    why: why[step.kind],
    action: action[step.kind],
    href: place(step) as Route,
  }))
}
