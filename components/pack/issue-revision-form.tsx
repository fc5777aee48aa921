'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import type { Route } from 'next'
import { useRouter } from 'next/navigation'
import { useState } from 'react'
import { useForm } from 'react-hook-form'
import { TextField } from '@/components/form/text-field'
import { Button } from '@/components/ui/button'
import { Notice } from '@/components/ui/notice'
import { showToast } from '@/components/ui/toast'
import { showRefusal } from '@/lib/client/form-refusal'
import { useIssueRevision } from '@/lib/client/revisions'
import { issueRevisionSchema } from '@/lib/contracts/revision'
import type { IssueRevision } from '@/lib/contracts/revision'

export interface IssueRevisionFormProps {
  tourId: string
  rigId: string
  /** The button's words, which say what comes of it: "Issue revision 8, full rig, 6 shows". */
  action: string
  number: number
}

/** The note of a revision and the button that freezes it. What was typed stays until the revision is issued. */
export function IssueRevisionForm({ tourId, rigId, action, number }: IssueRevisionFormProps) {
  const router = useRouter()
  const issue = useIssueRevision(rigId)
  // Made once a form: sending again after a lost answer is the same request.
  const [id] = useState(() => crypto.randomUUID())
  const form = useForm<IssueRevision, unknown, IssueRevision>({
    resolver: zodResolver(issueRevisionSchema),
    defaultValues: { id, note: '' },
  })
  const submit = form.handleSubmit(async (fields) => {
    try {
      const issued = await issue.mutateAsync(fields)
      showToast(`Revision ${issued.number} is issued.`)
      router.push(`/tours/${tourId}/revisions/${issued.id}` as Route)
      router.refresh()
    } catch (error) {
      showRefusal(form, error)
    }
  })
  const refused = form.formState.errors.root?.message
  return (
    <form
      noValidate
      aria-label={`Revision ${number}`}
      className="flex max-w-2xl flex-col gap-4"
      onSubmit={(event) => void submit(event)}
    >
      <TextField
        form={form}
        name="note"
        label="Note"
        lines={3}
        hint="What this revision is for, or what changed: its readers see it first. It cannot be changed afterwards."
      />
      {refused && (
        <Notice kind="error" word="Not issued">
          {refused}
        </Notice>
      )}
      <div>
        <Button type="submit" kind="primary" busy={issue.isPending ? 'Freezing the rig' : null}>
          {action}
        </Button>
      </div>
    </form>
  )
}
