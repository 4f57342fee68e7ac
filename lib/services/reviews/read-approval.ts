import { read } from '@/db/client'
import { approvalRow } from '@/db/queries/reviews'
import { sceneById } from '@/db/queries/scenes'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { ApprovalAnswer } from '@/lib/contracts/verdicts'
import { notFound } from '@/lib/errors/problem'
import { isApproval } from '@/lib/review/version-states'
import { withVersion } from './review-scene'
import { hashOf, verdictText } from './verdict-text'

/** The approval with what it was given on, so that whoever may read it can work the hash out again. */
export async function readApproval(
  person: Person | null,
  id: string,
  number: number,
): Promise<{ approval: ApprovalAnswer | null }> {
  return read(async (tx) => {
    const scene = await sceneById(tx, id)
    authorise(person, 'scene.read', scene)
    if (!scene) throw notFound('scene')
    const { version } = await withVersion(tx, scene, number)
    const found = await approvalRow(tx, id, number)
    if (!found || !isApproval(found.word)) return { approval: null }
    const of = verdictText(id, number, version.document)
    return {
      approval: {
        version: number,
        person: found.person,
        word: found.word,
        sentence: found.sentence,
        at: found.at.toISOString(),
        hash: found.hash,
        recomputed: hashOf(of),
        of,
      },
    }
  })
}
