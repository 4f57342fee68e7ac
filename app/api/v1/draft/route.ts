import * as contracts from '@/lib/contracts/drafts'
import { handle } from '@/lib/http/handle'
import { dropDraft } from '@/lib/services/drop-draft'
import { readDraft } from '@/lib/services/read-draft'
import { saveDraft } from '@/lib/services/save-draft'

export const GET = handle(contracts.readDraft, async ({ person }) => ({
  draft: await readDraft(person, null),
}))

export const PUT = handle(contracts.keepDraft, ({ person, body }) => saveDraft(person, null, body))

export const DELETE = handle(contracts.dropDraft, ({ person }) => dropDraft(person, null))
