import { db } from '@/db/client'
import { findDispatch } from '@/db/queries/dispatch'
import { cancelHeldMail, findMailState } from '@/db/queries/mail'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { notifyMailChanged } from '@/lib/server/mail/notify-mail-changed'

/** Stops a sending that is still held back. Once the mail service was asked, it is too late and says so. */
export async function stopDispatch(actor: Actor, input: { dispatchId: string }): Promise<{ stopped: true }> {
  assertCan(actor, 'advance:send')
  return db().transaction(async (tx) => {
    const found = await findDispatch(tx, actor, input.dispatchId)
    if (!found) throw new AppError('not-found', 'There is no such sending in this party.')
    if (await cancelHeldMail(tx, actor, found.mailId)) {
      await audit(tx, actor, 'dispatch.stop', { type: 'dispatch', id: found.id })
      await notifyMailChanged(tx, { id: found.mailId, partyId: actor.partyId })
    } else if (!(await findMailState(tx, actor, found.mailId))?.cancelledAt) {
      throw new AppError('conflict', 'It is too late to stop this: the mail is on its way. You can withdraw its link.')
    }
    return { stopped: true as const }
  })
}
