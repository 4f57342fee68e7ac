import { halfDiscMoment } from '@/lib/mechanics/balance/half-disc'
import type { Train } from '@/lib/mechanics/train'
import type { Quantity, System } from '@/lib/units/quantities'
import { asShown, type Changed, type Value } from '@/scene/model/change-words'
import { compareScenes, seenChanges, type SceneChange } from '@/scene/model/compare-scenes'
import { compareTrains } from '@/scene/model/compare-trains'
import type { CrankTrain } from '@/scene/model/crank-train'
import { applyNamed } from '@/scene/model/merge-scenes'
import { readScene } from '@/scene/model/read-scene'
import type { Scene } from '@/scene/model/scene'
import { toTrain } from '@/scene/model/to-train'
import { buildRig } from './build-rig'
import { changedParts, type ChangedParts } from './changed-parts'
import { clearanceList } from './clearance-list'
import { partsOfPath } from './parts-of-path'
import { webRoom } from './web-planes'

/** What follows from what was set: worked out anew from both documents at one speed. */
export interface Effect extends Changed {
  name: string
  /** The limit that the newer figure does not keep: "below 1.5 mm" is its SI value. */
  below: number | null
}

export interface ParameterChange extends SceneChange {
  /** Drawn parts it is about, of the newer version or, where it has gone, of the older. */
  parts: string[]
  /** What follows from it alone. */
  effects: Effect[]
}

export interface VersionChanges {
  speedRpm: number
  parameters: ParameterChange[]
  view: SceneChange[]
  /** What follows from several changes, or cannot be told to follow from one. */
  effects: Effect[]
  /** Parts that the drawing shows otherwise. */
  drawn: ChangedParts
}

/** Beyond so many changes it is not asked which of them an effect follows from. */
const MOST_TRIED = 6

/** The speed that effects are compared at: the newer engine's greatest, or the one it is looked at with. */
export const comparedSpeedRpm = ({ train, view }: Scene): number => train.operating?.maxRpm ?? view.speedRpm

/** Everything that changed between two versions of a scene, and what it does at one speed. Pure. */
export function compareVersions(
  older: Scene,
  newer: Scene,
  system: System,
  speedRpm = comparedSpeedRpm(newer),
): VersionChanges {
  const { parameters, view } = compareScenes(older, newer)
  const rigs = [older, newer].map(({ train }) => buildRig(train, toTrain(train)))
  const before = figuresOf(older, speedRpm)
  const effectsOf = (scene: Scene) => effectsBetween(before, figuresOf(scene, speedRpm), system)
  const effects = parameters.length > 0 ? effectsOf(newer) : []
  // an effect never hides with a change that is below display precision
  const seen = new Set(seenChanges(parameters, system).seen.map(({ key }) => key))
  const owners = ownersOf(older, newer, parameters, effects, effectsOf).map((key) =>
    key !== null && seen.has(key) ? key : null,
  )
  return {
    speedRpm,
    parameters: parameters.map((change) => ({
      ...change,
      parts: partsOf(change, rigs[change.is === 'removed' ? 0 : 1]),
      effects: effects.filter((_, i) => owners[i] === change.key),
    })),
    view,
    effects: effects.filter((_, i) => owners[i] === null),
    drawn: changedParts(rigs[0], rigs[1]),
  }
}

const partsOf = ({ paths }: SceneChange, rig: ReturnType<typeof buildRig>) => [
  ...new Set(paths.flatMap((path) => partsOfPath(path, rig))),
]

/** The key of the one change each effect follows from: it alone brings it about, and none of the others by itself does. */
function ownersOf(
  older: Scene,
  newer: Scene,
  parameters: SceneChange[],
  effects: Effect[],
  effectsOf: (scene: Scene) => Effect[],
): (string | null)[] {
  if (parameters.length === 1) return effects.map(() => parameters[0].key)
  if (parameters.length > MOST_TRIED) return effects.map(() => null)
  const alone = parameters.map((change) => {
    const read = readScene(applyNamed(older, newer, change.paths))
    return read.ok ? new Set(effectsOf(read.scene).map(({ name }) => name)) : null
  })
  // a change that cannot stand by itself may be behind anything
  if (alone.includes(null)) return effects.map(() => null)
  return effects.map(({ name }) => {
    const from = parameters.filter((_, i) => alone[i]?.has(name))
    return from.length === 1 ? from[0].key : null
  })
}

/** Rows of the comparison that repeat what was set. */
const inputs = new Set([
  ...['Cycle', 'Rotation from the free end', 'Firing order', 'Crank pins from the first', 'Speed'],
  ...['Bore', 'Stroke', 'Rod length', 'Offset', 'Compression ratio', 'Balance factor', 'Crank'],
])
const isInput = (name: string) => inputs.has(name.replace(/, (least|greatest)$/, ''))

/** What names a figure by its group where it does not speak for itself. */
const within: Record<string, string> = { 'Turning moment': 'Turning moment, ' }
const named = (group: string, name: string) =>
  group in within ? `${within[group]}${name.charAt(0).toLowerCase()}${name.slice(1)}` : name

/** One figure of one version, with the limit that it should keep, where it has one. */
interface FigureOf {
  quantity: Quantity | null
  value: Value
  limit?: number
}

/** Every figure that follows from what is set, by name. */
function figuresOf({ train: document }: Scene, speedRpm: number): Map<string, FigureOf> {
  const train = toTrain(document)
  const figures = new Map<string, FigureOf>()
  for (const { title, rows } of compareTrains([{ document, speedRpm }]))
    for (const { name, quantity = null, values } of rows)
      if (!isInput(name)) figures.set(named(title, name), { quantity, value: values[0] })
  webFigures(figures, document, train)
  clearanceFigures(figures, document, train)
  return figures
}

/** The fullest web: what a half disc holds, and the share of it that its counterweight takes. */
function webFigures(figures: Map<string, FigureOf>, document: CrankTrain, train: Train) {
  const { radius, thickness, density, stated } = webRoom(document, train)
  if (!stated || train.counterweights.length === 0) return
  const capacity = halfDiscMoment(radius, thickness, density)
  const fullest = Math.max(...train.counterweights.map((weight) => weight.mass * weight.radius))
  figures.set('Half-disc capacity of a web', { quantity: 'unbalance', value: capacity })
  figures.set('Fullest web, share of it used', { quantity: 'share', value: fullest / capacity })
}

/** The tightest gap of every kind. */
function clearanceFigures(figures: Map<string, FigureOf>, document: CrankTrain, train: Train) {
  const least = new Map<string, number>()
  for (const { name, gap, limit } of clearanceList(document, train, buildRig(document, train)).clearances) {
    if (gap >= (least.get(name) ?? Infinity)) continue
    least.set(name, gap)
    figures.set(name, { quantity: 'length', value: gap, limit })
  }
}

function effectsBetween(
  older: Map<string, FigureOf>,
  newer: Map<string, FigureOf>,
  system: System,
): Effect[] {
  return [...new Set([...older.keys(), ...newer.keys()])].flatMap((name) => {
    const [before, after] = [older.get(name), newer.get(name)]
    const quantity = before?.quantity ?? after?.quantity ?? null
    const [was, now] = [before?.value ?? null, after?.value ?? null]
    const limit = after?.limit
    const below = limit !== undefined && typeof now === 'number' && now < limit ? limit : null
    const effect = { name, quantity, was, now, below }
    return was !== now && asShown(effect, system).seen ? [effect] : []
  })
}
