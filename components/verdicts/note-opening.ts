import { call } from '@/lib/contracts/call'
import type { openVersionForReview } from '@/lib/contracts/verdicts'
import { paramsOf, type OfVersion } from './use-review'

/** Says that one has the version before one; a page that cannot say so is none the worse. */
export const noteOpening = (of: OfVersion) =>
  call<typeof openVersionForReview>({
    method: 'POST',
    path: '/api/v1/scenes/{id}/versions/{number}/openings',
    params: paramsOf(of),
  }).catch(() => {})
