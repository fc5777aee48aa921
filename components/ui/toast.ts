/** A short word about what was just done, with the way back. */
export interface Toast {
  id: number
  message: string
  undo: { label: string; run: () => void } | null
}

let toasts: readonly Toast[] = []
let next = 1
const listeners = new Set<() => void>()

function replace(value: readonly Toast[]) {
  toasts = value
  for (const listener of listeners) listener()
}

/** Shows a message in the toast region. The label of the undo says what it brings back ("Put Tom 12 back"). */
export function showToast(message: string, undo: Toast['undo'] = null): number {
  const id = next++
  // Three at most: a fourth would bury the way back of the first.
  replace([...toasts.slice(-2), { id, message, undo }])
  return id
}

export function dismissToast(id: number) {
  replace(toasts.filter((toast) => toast.id !== id))
}

export const toastStore = {
  subscribe(listener: () => void) {
    listeners.add(listener)
    return () => {
      listeners.delete(listener)
    }
  },
  read: () => toasts,
}
