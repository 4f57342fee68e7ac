import { answerChecklist as contract } from '@/lib/contracts/verdicts'
import { handle } from '@/lib/http/handle'
import { answerChecklist } from '@/lib/services/reviews/answer-checklist'

export const PUT = handle(contract, ({ person, params, body }) =>
  answerChecklist(person, params.id, params.number, body),
)
