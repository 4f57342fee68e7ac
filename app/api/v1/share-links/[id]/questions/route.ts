import * as contracts from '@/lib/contracts/share-links'
import { handle } from '@/lib/http/handle'
import { eraseLinkQuestions, listLinkQuestions } from '@/lib/services/link-questions'

export const GET = handle(contracts.listLinkQuestions, ({ person, params, query }) =>
  listLinkQuestions(person, params.id, query),
)

export const DELETE = handle(contracts.eraseLinkQuestions, ({ person, params }) =>
  eraseLinkQuestions(person, params.id),
)
