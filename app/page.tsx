import type { ReactNode } from 'react'
import { SceneDrawing } from '@/components/signature/scene-drawing'
import { ButtonLink } from '@/components/ui/button-link'
import { ThemeToggle } from '@/components/ui/theme-toggle'
import { ExampleAnswers } from './_landing/example-answers'
import { exampleScene } from './_landing/example-kit'
import { ExampleNotes } from './_landing/example-notes'
import { ExampleRecipients } from './_landing/example-recipients'
import { ExampleRun } from './_landing/example-run'
import { ExampleTrace } from './_landing/example-trace'

const kitWords =
  'A drum kit seen from above, audience at the foot: throne upstage, snare and hats on stage left, toms downstage of the snare, floor tom and ride on stage right, kick furthest downstage. Each drum carries its note, each microphone its channel.'

export default function Landing() {
  return (
    <>
      <header className="mx-auto flex max-w-7xl items-center justify-between gap-2 px-5 py-3 sm:px-8">
        <p className="name shrink-0 text-xl sm:text-2xl">Hoopwright</p>
        <div className="flex items-center gap-1 whitespace-nowrap">
          <ThemeToggle />
          <ButtonLink href="/sign-in">Sign in</ButtonLink>
        </div>
      </header>

      <main id="main">
        <div className="mx-auto grid max-w-7xl items-center gap-x-12 gap-y-8 px-5 pt-6 pb-12 sm:px-8 lg:grid-cols-[minmax(0,5fr)_minmax(0,6fr)] lg:pt-10">
          <div>
            <h1 className="text-[2.75rem] leading-[0.98] sm:text-6xl xl:text-7xl">
              Another rented kit every night. The same drums every night.
            </h1>
            <p className="mt-6 max-w-[34rem] text-lg">
              Hoopwright is for the drum team of a touring party and for the venues and suppliers that answer it. You
              draw the kit, its notes and its plot once; each venue says what it can really supply; and the local tech
              who unpacks the rented drums is led, lug by lug, to your notes.
            </p>
            <div className="mt-7 flex flex-wrap items-center gap-x-5 gap-y-3">
              <ButtonLink kind="primary" href="/sign-in" className="px-7 py-3 text-lg">
                Sign in to your party
              </ButtonLink>
              <ButtonLink href="/sign-up">Begin a party</ButtonLink>
              <p className="max-w-64 text-sm text-soft">
                Venue, supplier or local tech? Open the link in your mail; you need no account.
              </p>
            </div>
          </div>
          <div>
            <SceneDrawing
              scene={exampleScene(215)}
              label={kitWords}
              marginM={0.02}
              className="-mx-4 w-[calc(100%+2rem)] sm:hidden"
            />
            <SceneDrawing scene={exampleScene(260)} label={kitWords} className="hidden w-full sm:block" />
          </div>
        </div>

        <ExampleRun />

        <div className="mx-auto max-w-7xl px-5 sm:px-8">
          <Person
            who="Drum tech"
            does="Sets the kit and its notes, places it on the plot, issues the revision, and from the bus watches every head being tuned."
          >
            <ExampleNotes />
          </Person>
          <Person
            who="Tour manager"
            does="Sends each venue and supplier exactly what is asked of it, sees who has answered, and settles every difference."
          >
            <ExampleRecipients />
          </Person>
          <Person
            who="Venue or supplier"
            does="Answers line by line from a mailed link, on a phone: as asked, instead, not yet, can’t."
          >
            <ExampleAnswers />
          </Person>
        </div>
        <div data-theme="stage">
          <div className="mx-auto max-w-7xl px-5 sm:px-8">
            <Person
              who="Local tech"
              does="Tunes by the sheet of one show, on a phone in the dark: the outline is round when the head is even, and the lugs that are out are named."
            >
              <ExampleTrace />
            </Person>
          </div>
        </div>
      </main>

      <footer className="mx-auto max-w-7xl px-5 py-8 text-sm text-soft sm:px-8">
        The tour, the venues and the suppliers shown here are invented. Tensions and weights are estimates: where
        rigging, lifting or power is concerned, local codes and competent people decide.
      </footer>
    </>
  )
}

/** One of the four who work with it: who, in one sentence what, and the drawing they work by. */
function Person({ who, does, children }: { who: string; does: string; children: ReactNode }) {
  return (
    <section className="grid items-center gap-x-12 gap-y-6 border-t border-line py-12 first:border-t-0 lg:grid-cols-[minmax(0,5fr)_minmax(0,6fr)]">
      <div>
        <h2 className="text-4xl">{who}</h2>
        <p className="mt-3 max-w-[30rem] text-lg">{does}</p>
      </div>
      <div className="min-w-0">{children}</div>
    </section>
  )
}
