import { refused } from '@/lib/errors/problem'
import { trainSummary } from '@/lib/mechanics/analysis/summary'
import { buildPlan } from '@/lib/mechanics/plan'
import type { Issue } from '@/scene/model/issue'
import { readScene } from '@/scene/model/read-scene'
import { sceneSchema, type Scene } from '@/scene/model/scene'
import { shapeIssues } from '@/scene/model/shape-issues'
import { toTrain } from '@/scene/model/to-train'

/** Issues of a part of a request, with their paths from its root. */
export const under = (path: string, issues: readonly Issue[]): Issue[] =>
  issues.map((issue) => ({ ...issue, path: issue.path === '' ? path : `${path}.${issue.path}` }))

/** A scene that arrived: its train runs, or it is refused with every reason why not. */
export function acceptScene(value: unknown): Scene {
  const read = readScene(value)
  if (!read.ok) throw refused(under('document', read.issues))
  return read.scene
}

/** A draft, on its way in and out: it may hold a train that cannot run yet, so only its form is asked for. */
export function readDraftDocument(value: unknown): Scene {
  const result = sceneSchema.safeParse(value)
  if (!result.success) throw refused(under('document', shapeIssues(result.error, value)))
  return result.data
}

/** A scene that we stored, in whatever format: it was accepted then, and is read, never cast, now. */
export function storedScene(value: unknown): Scene {
  const read = readScene(value)
  if (read.ok) return read.scene
  throw new Error(
    `A stored scene cannot be read: ${read.issues.map(({ path, message }) => `${path}: ${message}`).join('; ')}`,
  )
}

/** What the list shows of a document. */
export function sceneFigures(scene: Scene) {
  const { cylinderCount, displacementCc } = trainSummary(buildPlan(toTrain(scene.train), 0))
  return { cylinderCount, displacementCc }
}
