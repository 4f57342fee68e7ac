import type { Train } from '@/lib/mechanics/train'
import { distinct, type Issue } from './issue'
import { migrate, type Migrations } from './migrate'
import { judgeTrain, migrateTrain } from './read-train'
import { sceneSchema, type Scene } from './scene'
import { shapeIssues } from './shape-issues'

export type ReadScene = { ok: true; scene: Scene; train: Train } | { ok: false; issues: Issue[] }

const CURRENT = 1
/** Older formats and how they become the next. */
const migrations: Migrations = {}

/** A scene document of any format so far, with its crank train judged as `readTrain` does; paths begin at the scene. */
export function readScene(json: unknown): ReadScene {
  const migrated = migrate(json, 'scene', CURRENT, migrations)
  if (!migrated.ok) return migrated
  const document = withTrain(migrated.json)
  if (!document.ok) return document
  const parsed = sceneSchema.safeParse(document.json)
  if (!parsed.success) return { ok: false, issues: distinct(shapeIssues(parsed.error, document.json)) }
  const judged = judgeTrain(parsed.data.train)
  return judged.ok ? { ok: true, scene: parsed.data, train: judged.train } : inTrain(judged)
}

function withTrain(json: unknown): { ok: true; json: unknown } | { ok: false; issues: Issue[] } {
  if (typeof json !== 'object' || json === null || !('train' in json)) return { ok: true, json }
  const train = migrateTrain(json.train)
  return train.ok ? { ok: true, json: { ...json, train: train.json } } : inTrain(train)
}

const inTrain = ({ issues }: { issues: Issue[] }) => ({
  ok: false as const,
  issues: issues.map((issue) => ({ ...issue, path: issue.path === '' ? 'train' : `train.${issue.path}` })),
})
