import type { Transaction } from '@/db/client'
import { approvalRow } from '@/db/queries/reviews'
import { isApproval } from '@/lib/review/version-states'

/** Who approved a version, if somebody did and nothing has taken its place since: for its stamp. */
export async function approvalOf(tx: Transaction, sceneId: string, version: number) {
  const found = await approvalRow(tx, sceneId, version)
  if (
    !found ||
    !isApproval(found.word) ||
    (found.state !== 'approved' && found.state !== 'approved-with-remarks')
  ) {
    return null
  }
  return { word: found.word, person: found.person, at: found.at, hash: found.hash }
}
