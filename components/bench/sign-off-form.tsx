import { useState } from 'react'
import type { FormEvent } from 'react'
import { Button } from '@/components/ui/button'
import { Field } from '@/components/ui/field'
import { TextArea } from '@/components/ui/text-area'
import { TextInput } from '@/components/ui/text-input'
import type { BenchSession } from '@/lib/client/bench/bench-session'
import { headStandingWords, headView, standingSignOff } from '@/lib/client/bench/head-view'
import type { Bench, BenchDrum } from '@/lib/contracts/bench'
import { clockWords } from './bench-words'

export interface SignOffFormProps {
  bench: Bench
  drum: BenchDrum
  session: BenchSession
  name: string
  keepName: ((name: string) => void) | null
}

/** Hands the drum over as tuned, by name, or takes that back. */
export function SignOffForm({ bench, drum, session, name, keepName }: SignOffFormProps) {
  const [remark, setRemark] = useState('')
  const [fault, setFault] = useState<string | undefined>(undefined)
  const signed = standingSignOff(bench, drum.entryId)
  const byName = name.trim()

  function sign(event: FormEvent) {
    event.preventDefault()
    if (byName === '') {
      setFault('Write your name first: the drum tech sees who handed the drum over.')
      document.getElementById('sign-off-name')?.focus()
      return
    }
    setFault(undefined)
    session.sign({ entryId: drum.entryId, decision: 'signed', byName, remark: remark.trim() })
    setRemark('')
  }

  return (
    <section aria-labelledby="sign-off" className="space-y-3 border-y border-ink py-3">
      <h2 id="sign-off" className="text-2xl">
        {signed ? `${drum.name} is signed off` : `Hand over ${drum.name}`}
      </h2>
      {signed ? (
        <div role="status" className="border-l-4 border-reed bg-sheet px-3 py-2">
          <p>
            By <strong>{signed.byName}</strong>
            {signed.at ? `, ${clockWords(signed.at, bench.show.zone)}` : ', waits for signal'}.
            {signed.remark && ` “${signed.remark}”`}
          </p>
          <Button
            className="mt-2"
            onClick={() =>
              session.sign({
                entryId: drum.entryId,
                decision: 'taken-back',
                byName: byName || signed.byName,
                remark: '',
              })
            }
          >
            Take the sign-off back
          </Button>
        </div>
      ) : (
        <form onSubmit={sign} noValidate className="space-y-3">
          <p className="text-soft">
            {drum.heads
              .map((head) => `${head.side}: ${headStandingWords(headView(bench.readings, drum, head), drum.lugCount)}`)
              .join('; ')}
            .
          </p>
          {keepName && (
            <Field id="sign-off-name" label="Your name" error={fault}>
              {(control) => (
                <TextInput
                  {...control}
                  value={name}
                  autoComplete="name"
                  maxLength={120}
                  onChange={(event) => keepName(event.target.value)}
                />
              )}
            </Field>
          )}
          <Field label="Remark for the drum tech" optional>
            {(control) => (
              <TextArea
                {...control}
                rows={2}
                value={remark}
                maxLength={2000}
                onChange={(event) => setRemark(event.target.value)}
              />
            )}
          </Field>
          <Button type="submit" className="min-h-14 w-full">
            Sign off {drum.name}
          </Button>
        </form>
      )}
    </section>
  )
}
