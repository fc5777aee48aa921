import { forbidden, notFound, redirect } from 'next/navigation'
import { AppError } from '@/lib/errors'

/** What a desk page shows: the use case's answer, or the page that fits its refusal. */
export async function pageAnswer<Answer>(answer: Promise<Answer>): Promise<Answer> {
  try {
    return await answer
  } catch (error) {
    if (!(error instanceof AppError)) throw error
    if (error.code === 'forbidden') forbidden()
    if (error.code === 'not-found') notFound()
    if (error.code === 'signed-out') redirect('/sign-in')
    throw error
  }
}
