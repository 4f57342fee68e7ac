import type { Transaction } from '@/db/client'
import { addJob } from '@/lib/queue/add-job'

/** Has the thumbnail of a new version drawn in the background. */
export const drawLater = (tx: Transaction, sceneId: string, version: number) =>
  addJob(tx, 'picture.draw', { sceneId, version }, { key: `picture:${sceneId}:${version}` })
