/** Every job and what it is told. Payloads hold ids only: the row says the rest when the job runs. */
export type TaskPayloads = {
  'send-mail': { mailId: string }
  /**
   * The tokens whose links stand in the PDF (null: a preview, without links), and the mail that waits for it (null: none).
   */
  'make-pack-pdf': {
    packId: string
    partyId: string
    mailId: string | null
    replyTokenId: string | null
    benchTokenId: string | null
  }
}
export type TaskName = keyof TaskPayloads
