import { z } from 'zod'

/** A link shown once: its secret is not stored, so it cannot be shown again. */
export const printedLinkSchema = z.object({
  href: z.url(),
  /** The same as a QR code, SVG. */
  qrSvg: z.string(),
  expiresAt: z.string(),
})
export type PrintedLink = z.infer<typeof printedLinkSchema>

export const withdrawnSchema = z.object({ withdrawn: z.literal(true) })

/** An expired link asks for a fresh one; it is mailed to the known address only. */
export const freshLinkSchema = z.object({ token: z.string().min(1).max(200) })
export const freshLinkSentSchema = z.object({ sent: z.literal(true) })
