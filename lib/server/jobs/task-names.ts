/** Every job and what it is told. Payloads hold ids only: the row says the rest when the job runs. */
export type TaskPayloads = {
  'send-mail': { mailId: string }
  'make-pack-pdf': { packId: string; partyId: string }
}
export type TaskName = keyof TaskPayloads
