import type { PayloadOf, TaskName } from '@/lib/queue/payloads'
import { cleanExpired } from '@/lib/services/clean-expired'
import { makeExport } from '@/lib/services/exports/make-export'
import { eraseOldOpenings } from '@/lib/services/link-openings'
import { sendDigest } from '@/lib/services/mail/send-digest'
import { sendMail } from '@/lib/services/mail/send-mail'
import { drawThumbnails } from '@/lib/services/pictures/thumbnail'
import { remindReview } from '@/lib/services/reviews/remind-review'

export type Tasks = { [Name in TaskName]: (payload: PayloadOf<Name>) => Promise<void> }

/** What a worker can do: every task of the queue, each a service. */
export const tasks: Tasks = {
  'picture.draw': ({ sceneId, version }) => drawThumbnails(sceneId, version),
  'export.make': ({ exportId }) => makeExport(exportId),
  'expired.clean': cleanExpired,
  'openings.erase': async () => void (await eraseOldOpenings(new Date())),
  'mail.send': ({ mailId }) => sendMail(mailId),
  'mail.digest': ({ userId }) => sendDigest(userId),
  'review.remind': ({ requestId, reminder }) => remindReview(requestId, reminder),
}
