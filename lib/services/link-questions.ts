import { eq } from 'drizzle-orm'
import { read, write } from '@/db/client'
import { pageOfQuestions } from '@/db/queries/link-log'
import { linkQuestions } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import type { LinkQuestion } from '@/lib/contracts/share-links'
import { audit } from './audit'
import { linkOf } from './link-of'

export async function listLinkQuestions(
  person: Person | null,
  id: string,
  page: { before?: string; limit: number },
): Promise<{ questions: LinkQuestion[]; next: string | null }> {
  return read(async (tx) => {
    await linkOf(tx, person, 'link.openings', id)
    const { rows, next } = await pageOfQuestions(tx, id, page)
    const questions = rows.map(({ linkId: _, createdAt, ...row }) => ({
      ...row,
      askedAt: createdAt.toISOString(),
    }))
    return { questions, next }
  })
}

/** What visitors wrote, with their names and addresses, forgotten on request. */
export async function eraseLinkQuestions(person: Person | null, id: string): Promise<{ erased: number }> {
  return write(async (tx) => {
    const { scene, person: by } = await linkOf(tx, person, 'link.erase', id)
    const { count } = await tx.delete(linkQuestions).where(eq(linkQuestions.linkId, id))
    await audit(tx, {
      actorId: by.id,
      workshopId: scene.workshopId,
      operation: 'link.erase',
      subject: `link:${id}`,
      before: { questions: count },
      after: { questions: 0 },
    })
    return { erased: count }
  })
}
