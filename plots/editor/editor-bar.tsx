'use client'

import { useState } from 'react'
import { Button } from '@/components/ui/button'
import { Checkbox } from '@/components/ui/checkbox'
import type { PlotSessionState } from '@/lib/client/plot/plot-session'
import type { StageSize } from '../model/document'
import { areaWords, type LengthUnits } from '../symbols/length-words'
import { parseLengthM } from '../symbols/parse-length'
import { CommitInput } from './commit-input'
import { boxUnit, lengthInBox } from './piece-fields'
import { SaveState } from './save-state'

export interface EditorBarProps {
  state: PlotSessionState
  mayEdit: boolean
  isSnapping: boolean
  onSnapping: (is: boolean) => void
  isList: boolean
  onList: (is: boolean) => void
  onUndo: () => void
  onRedo: () => void
  onZoom: (factor: number) => void
  onFitKit: () => void
  onFitPieces: () => void
  onFitStage: () => void
  stage: StageSize
  units: LengthUnits
  /** Returns why the size was refused, or null. */
  onStage: (stage: StageSize) => string | null
}

const tight = 'px-3'

/** What can be done with the whole plot. */
export function EditorBar(props: EditorBarProps) {
  const { state, mayEdit, isList, stage, units } = props
  const [isSizing, setIsSizing] = useState(false)
  const size = (axis: keyof StageSize) => (typed: string) => {
    const lengthM = parseLengthM(typed, units)
    return lengthM === null ? 'Write a length such as 10 or 32 ft' : props.onStage({ ...stage, [axis]: lengthM })
  }
  return (
    <div className="flex flex-col gap-3">
      <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
        {mayEdit && (
          <div role="group" aria-label="Steps" className="flex gap-1">
            <Button className={tight} disabled={!state.canUndo} onClick={props.onUndo}>
              Undo
            </Button>
            <Button className={tight} disabled={!state.canRedo} onClick={props.onRedo}>
              Redo
            </Button>
          </div>
        )}
        <div role="group" aria-label="Shown as" className="flex">
          {[false, true].map((list) => (
            <Button
              key={String(list)}
              kind={isList === list ? 'primary' : 'secondary'}
              className={tight}
              aria-pressed={isList === list}
              onClick={() => props.onList(list)}
            >
              {list ? 'List' : 'Drawing'}
            </Button>
          ))}
        </div>
        {!isList && (
          <div role="group" aria-label="View" className="flex flex-wrap gap-1">
            <Button className={tight} onClick={props.onFitKit}>
              Show the kit
            </Button>
            <Button className={tight} onClick={props.onFitPieces}>
              Show all pieces
            </Button>
            <Button className={tight} onClick={props.onFitStage}>
              Show the stage
            </Button>
            <Button className={tight} onClick={() => props.onZoom(1.4)}>
              Zoom in
            </Button>
            <Button className={tight} onClick={() => props.onZoom(1 / 1.4)}>
              Zoom out
            </Button>
          </div>
        )}
        {mayEdit && !isList && (
          <Checkbox
            label="Snap"
            checked={props.isSnapping}
            onChange={(event) => props.onSnapping(event.currentTarget.checked)}
            className="items-center!"
          />
        )}
        <div className="ml-auto flex items-center gap-4">
          {mayEdit ? (
            <Button kind="quiet" className="px-1" aria-expanded={isSizing} onClick={() => setIsSizing(!isSizing)}>
              Stage {areaWords(stage.widthM, stage.depthM, units)}
            </Button>
          ) : (
            <span className="text-sm">Stage {areaWords(stage.widthM, stage.depthM, units)}</span>
          )}
          <SaveState state={state} />
        </div>
      </div>
      {isSizing && (
        <div className="flex max-w-md gap-3">
          <CommitInput
            label="Stage width"
            value={lengthInBox(stage.widthM, units)}
            unit={boxUnit(units)}
            onCommit={size('widthM')}
          />
          <CommitInput
            label="Stage depth"
            value={lengthInBox(stage.depthM, units)}
            unit={boxUnit(units)}
            onCommit={size('depthM')}
          />
        </div>
      )}
    </div>
  )
}
