import * as contracts from '@/lib/contracts/drafts'
import { handle } from '@/lib/http/handle'
import { dropDraft } from '@/lib/services/drop-draft'
import { readDraft } from '@/lib/services/read-draft'
import { saveDraft } from '@/lib/services/save-draft'

export const GET = handle(contracts.readSceneDraft, async ({ person, params }) => ({
  draft: await readDraft(person, params.id),
}))

export const PUT = handle(contracts.keepSceneDraft, ({ person, params, body }) =>
  saveDraft(person, params.id, body),
)

export const DELETE = handle(contracts.dropSceneDraft, ({ person, params }) => dropDraft(person, params.id))
