import type { Train } from '@/lib/mechanics/train'
import { firingIssues } from './checks/firing'
import { gasIssues } from './checks/gas'
import { geometryIssues } from './checks/geometry'
import { referenceIssues } from './checks/references'
import { valueIssues } from './checks/values'
import { crankTrainSchema, type CrankTrain } from './crank-train'
import { distinct, type Issue } from './issue'
import { migrate, type Migrations } from './migrate'
import { shapeIssues } from './shape-issues'
import { toTrain } from './to-train'

export type { Issue } from './issue'

export type ReadTrain = { ok: true; document: CrankTrain; train: Train } | { ok: false; issues: Issue[] }

const CURRENT = 1
/** Older formats and how they become the next. */
const migrations: Migrations = {}

/** A document of any older format of the crank train, brought to the present one. */
export const migrateTrain = (json: unknown) => migrate(json, 'crank-train', CURRENT, migrations)

/**
 * The only door into the kernel: takes anything, and gives a document whose crank train turns and fires, or every
 * reason why not. Later checks need what earlier ones found right, so a document with a wrong shape is judged on its
 * shape alone, and firing only where the crank turns.
 */
export function readTrain(json: unknown): ReadTrain {
  const migrated = migrateTrain(json)
  if (!migrated.ok) return migrated
  const parsed = crankTrainSchema.safeParse(migrated.json)
  if (!parsed.success) return { ok: false, issues: distinct(shapeIssues(parsed.error, migrated.json)) }
  return judgeTrain(parsed.data)
}

/** The same for a document that already has the right shape. */
export function judgeTrain(document: CrankTrain): ReadTrain {
  const references = referenceIssues(document)
  const values = valueIssues(document)
  const readable = [...references, ...values].every(({ code }) => standAlone.has(code))
  const geometry = readable ? geometryIssues(document) : []
  const issues = [...references, ...geometry, ...values, ...gasIssues(document)]
  if (issues.length > 0) return { ok: false, issues: distinct(issues) }
  const train = toTrain(document)
  const firing = firingIssues(train)
  return firing.length > 0 ? { ok: false, issues: distinct(firing) } : { ok: true, document, train }
}

/** Refusals that leave the geometry readable. */
const standAlone = new Set([
  'firing-order-repeats',
  'firing-order-misses',
  'speeds-out-of-order',
  'mains-coincide',
  'centre-of-gravity-outside',
])
