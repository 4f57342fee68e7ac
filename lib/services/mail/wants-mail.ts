import { and, eq } from 'drizzle-orm'
import type { Transaction } from '@/db/client'
import { mailPreferences, memberships, type mails } from '@/db/schema'
import { letterNameSchema } from '@/lib/letters/letter-data'
import { kindOf } from '@/lib/letters/mail-kinds'

type Addressed = Pick<typeof mails.$inferSelect, 'template' | 'userId' | 'workshopId'>

/** Whether its reader still gets it: has not turned its kind off, nor left the workshop that it is about. */
export async function wantsMail(
  tx: Transaction,
  { template, userId, workshopId }: Addressed,
): Promise<boolean> {
  const kind = kindOf(letterNameSchema.parse(template))
  if (!kind || !userId) return true
  const [choice] = await tx
    .select({ wanted: mailPreferences.wanted })
    .from(mailPreferences)
    .where(and(eq(mailPreferences.userId, userId), eq(mailPreferences.kind, kind)))
  if (choice?.wanted === false) return false
  if (!workshopId) return true
  const [member] = await tx
    .select({ userId: memberships.userId })
    .from(memberships)
    .where(and(eq(memberships.userId, userId), eq(memberships.workshopId, workshopId)))
  return member !== undefined
}
