import { firingOf } from '@/lib/mechanics/firing'
import { intervalsInWords, layoutInWords } from '@/scene/model/summary'
import { toTrain } from '@/scene/model/to-train'
import { storedScene } from './scene-document'

export interface ScenePattern {
  /** "8 cylinders in two banks, 90° apart" */
  layout: string
  /** "every 90°" */
  firing: string
}

/** Versions never change, so what was worked out of one holds for good; only so many are kept. */
const kept = new Map<string, ScenePattern>()
const most = 5000
const degrees = 180 / Math.PI

/** How a version is laid out and fires, in words: worked out of its document, never stored. */
export function scenePattern(sceneId: string, version: number, document: unknown): ScenePattern {
  const key = `${sceneId} ${version}`
  const known = kept.get(key)
  if (known) return known
  const { train } = storedScene(document)
  const { intervals, even } = firingOf(toTrain(train))
  const firing = intervalsInWords(
    intervals.map((interval) => interval * degrees),
    even,
  )
  const pattern = { layout: layoutInWords(train), firing }
  if (kept.size >= most) kept.clear()
  kept.set(key, pattern)
  return pattern
}
