import { refused } from '@/lib/errors/problem'
import type { Train } from '@/lib/mechanics/train'
import { readTrain } from '@/scene/model/read-train'
import { under } from './scene-document'

/** A train that arrived, or every reason why it cannot be one. */
export function arrivingTrain(json: unknown) {
  const read = readTrain(json)
  if (!read.ok) throw refused(under('train', read.issues))
  return read
}

/** Refuses an answer that would hold more than `most` figures, with a step that would do. */
export function refuseTooMany(train: Train, stepDeg: number, perAngle: number, most: number): void {
  const figures = perAngle * Math.round((train.cycle * 180) / Math.PI / stepDeg)
  if (figures <= most) return
  const finest = Math.ceil((stepDeg * figures) / most / 0.5) * 0.5
  throw refused([
    {
      path: 'stepDeg',
      code: 'too-many-samples',
      message: `${train.cylinders.length} cylinders at every ${stepDeg}° are more figures than one answer holds.`,
      fix: `Give a step of ${finest}° or more.`,
    },
  ])
}
