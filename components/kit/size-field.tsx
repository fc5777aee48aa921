import { useWatch } from 'react-hook-form'
import { inchFractions, millimetresOf, parseSize } from '@/lib/staging/size'
import { TextField } from './text-field'

/** A size as the trade writes it, with the millimetres beside it as it is typed. */
export function SizeField({ path, label }: { path: string; label: string }) {
  const text = useWatch({ name: path }) as string
  const { inches } = parseSize(text)
  return (
    <TextField
      path={path}
      label={label}
      unit="in"
      hint={inches === null ? 'inches, or mm' : `${inchFractions(inches)} in, ${Math.round(millimetresOf(inches))} mm`}
    />
  )
}
