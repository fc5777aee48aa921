import { useSearchParams } from 'next/navigation'

/** Whether the pieces stand as a list instead of the drawing; it is kept in the address. */
export function useListView(): [isList: boolean, setIsList: (is: boolean) => void] {
  const params = useSearchParams()
  const setIsList = (is: boolean) => {
    const next = new URLSearchParams(params)
    if (is) next.set('view', 'list')
    else next.delete('view')
    window.history.replaceState(null, '', next.size > 0 ? `?${next}` : window.location.pathname)
  }
  return [params.get('view') === 'list', setIsList]
}
