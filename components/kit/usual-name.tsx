import { useEffect } from 'react'
import { useFormContext, useFormState, useWatch } from 'react-hook-form'
import { usualDrumName } from '@/lib/contracts/kit-defaults'
import type { DrumForm } from '@/lib/contracts/kit-form'
import { parseSize } from '@/lib/staging/size'

/** Names a new drum by what it is and its width for as long as nobody gives it a name of its own. */
export function UsualName() {
  const { setValue } = useFormContext<DrumForm>()
  const { touchedFields } = useFormState<DrumForm>()
  const [role, width] = useWatch<DrumForm, ['spec.role', 'spec.diameterIn']>({ name: ['spec.role', 'spec.diameterIn'] })
  const { inches } = parseSize(width)
  const own = touchedFields.name === true
  useEffect(() => {
    if (!own && inches !== null) setValue('name', usualDrumName(role, inches))
  }, [own, role, inches, setValue])
  return null
}
