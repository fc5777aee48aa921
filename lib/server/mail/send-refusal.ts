/** What the mail service's SDK gives back instead of an id. A body that is JSON but not the service's own may lack any of these. */
export type SendError = { readonly name?: string; readonly message?: string; readonly statusCode?: number | null } | null

/** Names under which the service says that a key was used before with another body: an earlier try was taken. */
const usedBefore = 'invalid_idempotent_request'

/** Whether a refusal can pass by itself, or is final; with what a person should know of it. */
export type Refusal = { readonly passing: true; readonly words: string } | { readonly passing: false; readonly words: string }

/**
 * Reads a refusal of the mail service. No status means that no answer came (the SDK tells a broken connection, a time-out and an
 * answer that is not JSON so): the mail may or may not have been taken, and trying again with its own key is safe. 408, 425, 429
 * and 5xx pass; 409 passes while the service is still busy with the same key. 401 and 403 are a wrong key of ours, which somebody
 * puts right while the mail waits. All else is about this mail and will not change by itself.
 */
export function readRefusal(error: SendError): Refusal {
  const status = error?.statusCode ?? null
  const words = error?.message ?? 'no reason given'
  if (status === 409 && error?.name === usedBefore) {
    return { passing: false, words: 'An earlier try was taken by the mail service, but its answer was lost. Ask the reader before you send it again.' }
  }
  const passing = status === null || [401, 403, 408, 409, 425, 429].includes(status) || status >= 500
  return passing ? { passing, words } : { passing, words: `The mail service refused it: ${words}` }
}
