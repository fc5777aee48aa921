import type { ReactNode } from 'react'
import { supplies, supplyWords } from '@/lib/contracts/kit'
import { TextField } from './text-field'

const supplyOptions = supplies.map((supply) => ({ value: supply, label: supplyWords[supply] }))

/** What every entry has: its name, who brings it, a remark. */
export function CommonFields({ children }: { children?: ReactNode }) {
  return (
    <div className="grid grid-cols-2 gap-x-4 gap-y-3 sm:grid-cols-4">
      <TextField path="name" label="Name" />
      <TextField path="supply" label="Brought by" options={supplyOptions} />
      {children}
      <TextField path="remark" label="Remark" optional className="max-sm:col-span-2" />
    </div>
  )
}
