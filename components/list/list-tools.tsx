import type { Route } from 'next'
import Form from 'next/form'
import { Button } from '@/components/ui/button'
import { ButtonLink } from '@/components/ui/button-link'
import { Field } from '@/components/ui/field'
import { Select } from '@/components/ui/select'
import { TextInput } from '@/components/ui/text-input'
import type { ListQuery } from '@/lib/contracts/list'
import { listAddress } from './list-address'

export interface ListToolsProps {
  path: string
  query: ListQuery<string, string>
  /** What is searched ("Name, town or country"). */
  searched: string
  filters: readonly { value: string; label: string }[]
}

/** Finds and filters a list through its address, so that it can be kept, sent and gone back to. */
export function ListTools({ path, query, searched, filters }: ListToolsProps) {
  const narrowed = query.q !== '' || query.filter !== 'all'
  return (
    // Filled afresh when the address changes, such as by the way back.
    <Form
      key={`${query.q} ${query.filter}`}
      action={path as Route}
      className="flex w-full flex-wrap items-end gap-3"
      role="search"
    >
      <input type="hidden" name="sort" value={query.sort} />
      <input type="hidden" name="order" value={query.order} />
      <Field label={searched} className="min-w-48 grow sm:max-w-72">
        {(control) => <TextInput {...control} name="q" type="search" defaultValue={query.q} autoComplete="off" />}
      </Field>
      <Field label="Show" className="min-w-40">
        {(control) => <Select {...control} name="filter" defaultValue={query.filter} options={filters} />}
      </Field>
      <Button type="submit">Find</Button>
      {narrowed && (
        <ButtonLink kind="quiet" href={listAddress(path, query, { q: '', filter: 'all' })}>
          Show all
        </ButtonLink>
      )}
    </Form>
  )
}
