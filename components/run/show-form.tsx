'use client'

import { useRouter } from 'next/navigation'
import { useWatch } from 'react-hook-form'
import { ChoiceField } from '@/components/form/choice-field'
import { SaveForm } from '@/components/form/save-form'
import { TextField } from '@/components/form/text-field'
import { WallField } from '@/components/form/wall-field'
import { ZoneField } from '@/components/form/zone-field'
import { ButtonLink } from '@/components/ui/button-link'
import { EmptyState } from '@/components/ui/empty-state'
import { changeShow, createShow } from '@/lib/client/tours'
import { useSavingForm } from '@/lib/client/use-saving-form'
import type { Show, ShowInput } from '@/lib/contracts/tour'
import { showInputOf, showInputSchema, showSchema } from '@/lib/contracts/tour'
import { dateWords } from '@/lib/staging/calendar'
import { FestivalFields } from './festival-fields'
import type { ShowChoices } from './show-choices'

const names = {
  name: 'Name',
  dayId: 'Day',
  rigId: 'Rig',
  stageId: 'Stage',
  playerId: 'Player',
  zone: 'Time zone',
  loadInTime: 'Load-in',
  showTime: 'Show time',
  showDayOffset: 'Show falls on',
  answersDue: 'Answers due',
  slot: 'Festival slot',
  sharedKit: 'Shared kit',
}

export interface ShowFormProps {
  tourId: string
  show: Show | null
  /** The day that a new show is put on. */
  dayId: string
  choices: ShowChoices
  onClose: () => void
}

/** A show: its day, rig, stage and player, and its times as the wall at the venue shows them. */
export function ShowForm(props: ShowFormProps) {
  if (props.choices.stages.length === 0) {
    return (
      <EmptyState
        title="No stage in the directory yet"
        action={<ButtonLink href="/directory/venues">Add the first venue</ButtonLink>}
      >
        A show stands on a stage of a venue. Add the venue and its stage first; the kit is then drawn to that stage.
      </EmptyState>
    )
  }
  return <ShowFields {...props} />
}

function ShowFields({ tourId, show, dayId, choices, onClose }: ShowFormProps) {
  const router = useRouter()
  const saving = useSavingForm<ShowInput, Show>({
    schema: showInputSchema,
    start: show ? showInputOf(show) : newShow(dayId, choices),
    version: show?.version ?? null,
    key: 'show',
    save: ({ id, version, fields }) => (show ? changeShow(show.id, version, fields) : createShow(tourId, id, fields)),
    readCurrent: (current) => {
      const row = showSchema.safeParse(current).data
      return row ? { version: row.version, fields: showInputOf(row) } : null
    },
    onSaved: () => {
      onClose()
      router.refresh()
    },
  })
  const { form } = saving
  const stageId = useWatch({ control: form.control, name: 'stageId' })
  const venueZone = choices.stages.find((stage) => stage.id === stageId)?.zone
  const options = {
    dayId: choices.days.map(({ id, date }) => ({ value: id, label: dateWords(date) })),
    rigId: choices.rigs.map(({ id, name }) => ({ value: id, label: name })),
    stageId: choices.stages.map(({ id, label }) => ({ value: id, label })),
    playerId: choices.players.map(({ id, name }) => ({ value: id, label: name })),
  }
  return (
    <SaveForm
      saving={saving}
      label={show ? show.venueName : 'New show'}
      action={show ? 'Save the show' : 'Put this show on the run'}
      busy="Saving the show"
      names={names}
      say={(field, value) =>
        field in options
          ? options[field as keyof typeof options].find((option) => option.value === value)?.label
          : undefined
      }
      onClose={onClose}
    >
      <div className="grid gap-4 sm:grid-cols-2">
        <ChoiceField form={form} name="dayId" label="Day" options={options.dayId} />
        <ChoiceField form={form} name="stageId" label="Stage" options={options.stageId} placeholder="Choose a stage" />
        <ChoiceField form={form} name="rigId" label="Rig" options={options.rigId} />
        <ChoiceField
          form={form}
          name="playerId"
          label="Player"
          options={options.playerId}
          placeholder="Choose a player"
        />
      </div>
      <TextField
        form={form}
        name="name"
        label="Name of the show"
        optional
        hint="Where the venue's name is not enough: a festival, a matinee"
      />
      <div className="grid gap-4 sm:grid-cols-3">
        <TextField form={form} name="loadInTime" label="Load-in" type="time" optional emptyIsNull />
        <TextField form={form} name="showTime" label="Show time" type="time" optional emptyIsNull />
        <ChoiceField
          form={form}
          name="showDayOffset"
          label="Show falls on"
          numeric
          options={[
            { value: '0', label: 'the same day' },
            { value: '1', label: '+1 day, after midnight' },
          ]}
        />
      </div>
      <ZoneField
        form={form}
        name="zone"
        hint={
          venueZone
            ? `Empty takes the venue's: ${venueZone}`
            : "The venue's zone is not known yet; times stay as the wall there shows them."
        }
      />
      <WallField form={form} name="answersDue" label="Answers due" hint="As the wall at the venue shows it." />
      <FestivalFields form={form} />
    </SaveForm>
  )
}

function newShow(dayId: string, choices: ShowChoices): ShowInput {
  return {
    name: '',
    dayId,
    rigId: choices.rigs[0]?.id ?? '',
    stageId: '',
    playerId: choices.usualPlayerId ?? '',
    zone: null,
    loadInTime: null,
    showTime: null,
    showDayOffset: 0,
    answersDue: null,
    slot: null,
    sharedKit: null,
  }
}
