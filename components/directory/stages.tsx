'use client'

import { OpenedForm } from '@/components/form/opened-form'
import { RemoveButton } from '@/components/form/remove-button'
import { EmptyState } from '@/components/ui/empty-state'
import { stages as api } from '@/lib/client/directory'
import type { Stage } from '@/lib/contracts/directory'
import { stageAccessWords, stageInputSchema } from '@/lib/contracts/directory'
import type { LengthUnits } from '@/lib/staging/length'
import { formatLength } from '@/lib/staging/length'
import { StageForm } from './stage-form'

export interface StagesProps {
  venueId: string
  stages: readonly Stage[]
  units: LengthUnits
  mayEdit: boolean
}

/** The stages of a venue, each with its size, its way in and its supply. */
export function Stages({ venueId, stages, units, mayEdit }: StagesProps) {
  return (
    <>
      {stages.length === 0 && (
        <div className="mt-3">
          <EmptyState title="No stage yet">
            {mayEdit
              ? 'Add the stage with its width and depth: the plot is drawn to it, and a show names it.'
              : 'The tour manager adds the stage; its size then stands here.'}
          </EmptyState>
        </div>
      )}
      {stages.length > 0 && (
        <ul className="mt-3 border-t-2 border-ink">
          {stages.map((stage) => (
            <li key={stage.id} className="border-b border-line py-2">
              <div className="flex flex-wrap items-baseline gap-x-6">
                <h3 className="text-xl">{stage.name}</h3>
                <span>
                  {formatLength(stage.widthM, units)} wide, {formatLength(stage.depthM, units)} deep
                </span>
                <span>{stage.heightM > 0 ? `deck ${formatLength(stage.heightM, units)} high` : 'on the floor'}</span>
              </div>
              <p className="text-soft">{stageWords(stage)}</p>
              {mayEdit && (
                <div className="-ml-4 flex flex-wrap items-center gap-x-2">
                  <OpenedForm action={`Change ${stage.name}`} kind="quiet">
                    {(close) => <StageForm venueId={venueId} stage={stage} units={units} onClose={close} />}
                  </OpenedForm>
                  <RemoveButton
                    action={`Take ${stage.name} away`}
                    busy="Taking it away"
                    done={`${stage.name} is gone`}
                    remove={() => api.remove(stage.id, stage.version)}
                    undo={{
                      label: `Put ${stage.name} back`,
                      // The contract leaves out what only a stored stage has.
                      run: () => api.create(`/api/venues/${venueId}/stages`, stage.id, stageInputSchema.parse(stage)),
                    }}
                  />
                </div>
              )}
            </li>
          ))}
        </ul>
      )}
      {mayEdit && (
        <div className="mt-3">
          <OpenedForm
            action={stages.length === 0 ? 'Add the first stage' : 'Add a stage'}
            kind={stages.length === 0 ? 'primary' : 'secondary'}
          >
            {(close) => <StageForm venueId={venueId} stage={null} units={units} onClose={close} />}
          </OpenedForm>
        </div>
      )}
    </>
  )
}

function stageWords({ access, volts, mainsHz, inlets }: Stage): string {
  const way =
    access.length > 0 ? `in by ${access.map((one) => stageAccessWords[one]).join(', ')}` : 'way in not known yet'
  const supply = volts
    ? [`${volts} V`, mainsHz ? `${mainsHz} Hz` : ''].filter(Boolean).join(', ')
    : 'supply not known yet'
  return [way, supply, inlets].filter(Boolean).join('; ')
}
