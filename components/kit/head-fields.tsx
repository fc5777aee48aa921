import { useWatch } from 'react-hook-form'
import { defaultTensionRange } from '@/lib/acoustics/tension-range'
import type { DrumRole } from '@/lib/acoustics/tension-range'
import { micrometreWords, parsePlies } from '@/lib/staging/plies'
import { TextField } from './text-field'

const films = [
  { value: 'coated', label: 'coated' },
  { value: 'clear', label: 'clear' },
  { value: 'other', label: 'other' },
]
const dampings = [
  { value: 'none', label: 'none' },
  { value: 'ring', label: 'ring' },
  { value: 'dot', label: 'centre dot' },
  { value: 'gel', label: 'gel' },
  { value: 'felt', label: 'felt strip' },
]

/** What one head is made of, and where the drum tech last had it. */
export function HeadFields({ path }: { path: 'spec.batter' | 'spec.resonant' }) {
  const { plyMils } = parsePlies(useWatch({ name: `${path}.plyMils` }) as string)
  const role = useWatch({ name: 'spec.role' }) as DrumRole
  const usual = defaultTensionRange(role, path === 'spec.batter' ? 'batter' : 'resonant')
  return (
    <div className="grid grid-cols-2 gap-x-4 gap-y-3 sm:grid-cols-3">
      <TextField
        path={`${path}.plyMils`}
        label="Plies"
        unit="mil"
        hint={plyMils ? micrometreWords(plyMils) : '10, or 7 + 7'}
      />
      <TextField path={`${path}.film`} label="Film" options={films} />
      <TextField path={`${path}.damping`} label="Damping" options={dampings} />
      <TextField path={`${path}.coatingGPerM2`} label="Coating adds" unit="g/m²" hint="0 if not known" />
      <TextField path={`${path}.gauge`} label="Gauge, noted" optional unit="" hint="your own gauge’s reading" />
      <TextField
        path={`${path}.range.slackNPerM`}
        label="Slack under"
        optional
        unit="N/m"
        hint={`film tension; ${usual.slackNPerM} from memory`}
      />
      <TextField
        path={`${path}.range.chokedNPerM`}
        label="Chokes over"
        optional
        unit="N/m"
        hint={`film tension; ${usual.chokedNPerM} from memory`}
      />
    </div>
  )
}
