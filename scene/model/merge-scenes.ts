import {
  differencesOf,
  nameOf,
  named,
  ORDER,
  pathKey,
  sameValue,
  valueIn,
  within,
  type Difference,
  type NamedPath,
} from './differences'
import { readScene, type ReadScene } from './read-scene'
import type { Scene } from './scene'

/** A place that both have changed since their common base, and not to the same. */
export interface Conflict {
  key: string
  path: NamedPath
  base: unknown
  theirs: unknown
  mine: unknown
}

export type Choice = 'mine' | 'theirs'

/** By the key of the conflict; what is not chosen stays theirs. */
export type Choices = Readonly<Record<string, Choice | undefined>>

export interface Merged {
  conflicts: Conflict[]
  /** The scene that has both, judged as any other: what each set right by itself may be wrong together. */
  read: ReadScene
}

/**
 * Brings what I changed since `base` into theirs: my value where only I changed, theirs where only they did, and the
 * chosen one where both did.
 */
export function mergeScenes(base: Scene, theirs: Scene, mine: Scene, choices: Choices = {}): Merged {
  const [ours, others] = [differencesOf(base, mine), differencesOf(base, theirs)]
  const conflicts = conflictsOf(ours, others, { base, theirs, mine })
  const taken = conflicts.filter(({ key }) => choices[key] === 'mine')
  const free = ours.filter(({ path }) => !conflicts.some((conflict) => within(path, conflict.path)))
  const chosen: Difference[] = [
    ...taken.map(({ path, base: was, mine: now }) => ({ path, was, now })),
    ...free,
  ]
  const values = chosen.filter(({ path }) => path.at(-1) !== ORDER)
  const merged = values.reduce<unknown>((at, { path, now }) => setIn(at, path, now), theirs)
  return { conflicts, read: readScene(arranged(merged, theirs, mine, others, chosen)) }
}

interface Three {
  base: Scene
  theirs: Scene
  mine: Scene
}

function conflictsOf(ours: Difference[], others: Difference[], scenes: Three): Conflict[] {
  const places = ours.flatMap((mine) =>
    others.flatMap((their) => {
      if (pathKey(mine.path) === pathKey(their.path)) return sameValue(mine.now, their.now) ? [] : [mine.path]
      if (within(mine.path, their.path)) return [their.path]
      return within(their.path, mine.path) ? [mine.path] : []
    }),
  )
  // how the engine is looked at is one thing: nobody picks a camera from one and its angle from the other
  const whole = places.map((path) => (path[0] === 'view' ? ['view'] : path))
  const outermost = whole.filter((path) => !whole.some((other) => other !== path && inside(path, other)))
  const keys = new Set(outermost.map(pathKey))
  const at = (list: Difference[], path: NamedPath, scene: Scene) =>
    list.find((one) => pathKey(one.path) === pathKey(path))?.now ?? valueIn(scene, path)
  return [...keys].map((key) => {
    const path = outermost.find((one) => pathKey(one) === key)!
    return {
      ...{ key, path },
      base: valueIn(scenes.base, path),
      theirs: at(others, path, scenes.theirs),
      mine: at(ours, path, scenes.mine),
    }
  })
}

const inside = (inner: NamedPath, outer: NamedPath) => inner.length > outer.length && within(inner, outer)

/** A new document that differs only along the path; undefined takes a field or an entry out. */
function setIn(document: unknown, [step, ...rest]: NamedPath, value: unknown): unknown {
  if (step === undefined) return value
  if (step.startsWith('#')) {
    const list = (document ?? []) as unknown[]
    const at = list.findIndex((entry) => nameOf(entry) === step)
    const next = setIn(list[at], rest, value)
    if (next === undefined) return list.filter((_, i) => i !== at)
    return at < 0 ? [...list, next] : list.with(at, next)
  }
  const object = (document ?? {}) as Record<string, unknown>
  const next = setIn(object[step], rest, value)
  const { [step]: _old, ...others } = object
  return next === undefined ? others : { ...object, [step]: next }
}

/** The older scene with only these places as the newer one has them. */
export const applyNamed = (older: Scene, newer: Scene, paths: readonly NamedPath[]): unknown =>
  paths
    .filter((path) => path.at(-1) !== ORDER)
    .reduce<unknown>((at, path) => setIn(at, path, valueIn(newer, path)), older)

/** Puts the entries of every list in order: theirs, or mine where I have rearranged it; new ones after the one before them. */
function arranged(
  merged: unknown,
  theirs: Scene,
  mine: Scene,
  others: Difference[],
  chosen: Difference[],
): unknown {
  const lists = new Map<string, NamedPath>()
  for (const { path } of [...others, ...chosen]) {
    const end = path.findIndex((step) => step === ORDER || step.startsWith('#'))
    if (end >= 0) lists.set(pathKey(path.slice(0, end)), path.slice(0, end))
  }
  return [...lists.values()].reduce((document, path) => {
    const entries = named(valueIn(document, path))
    if (!entries) return document
    const namesIn = (scene: Scene) => [...(named(valueIn(scene, path))?.keys() ?? [])]
    const rearranged = chosen.some((one) => pathKey(one.path) === pathKey([...path, ORDER]))
    const [first, second] = rearranged ? [mine, theirs] : [theirs, mine]
    const order = woven(namesIn(first), namesIn(second), entries)
    return setIn(
      document,
      path,
      order.map((name) => entries.get(name)),
    )
  }, merged)
}

function woven(first: string[], second: string[], present: ReadonlyMap<string, unknown>): string[] {
  const order = first.filter((name) => present.has(name))
  second.forEach((name, i) => {
    if (!present.has(name) || order.includes(name)) return
    const before = second.slice(0, i).findLast((other) => order.includes(other))
    order.splice(before === undefined ? 0 : order.indexOf(before) + 1, 0, name)
  })
  return order
}
