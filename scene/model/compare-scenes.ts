import { asShown, placeInWords, quantityOf, valueOf, type Changed } from './change-words'
import { differencesOf, pathKey, valueIn, type Difference, type NamedPath } from './differences'
import { listed } from './say'
import type { Scene } from './scene'
import type { System } from '@/lib/units/quantities'

/** Something that was set otherwise, or a part that came or went. */
export interface SceneChange extends Changed {
  key: string
  /** Where: several places where the same was done to each. */
  paths: NamedPath[]
  name: string
  is: 'changed' | 'added' | 'removed'
}

export interface SceneChanges {
  /** Of the crank train. */
  parameters: SceneChange[]
  /** Of how it is looked at: camera, angle, what is hidden and shown. */
  view: SceneChange[]
}

/** What somebody did between two versions of a scene, in the words of the trade. Pure, and the same on page and server. */
export function compareScenes(older: Scene, newer: Scene): SceneChanges {
  const all = differencesOf(older, newer)
  const changes = all.map((difference) => changeOf(difference, older, newer))
  const of = (part: string) => changes.filter(({ paths }) => paths[0][0] === part)
  return { parameters: together(of('train'), older, newer), view: of('view') }
}

function changeOf(difference: Difference, older: Scene, newer: Scene): SceneChange {
  const { path, was, now } = difference
  const figure = [was, now].some((value) => typeof value === 'number') ? quantityOf(path) : null
  return {
    key: pathKey(path),
    paths: [path],
    name: placeInWords(path, older, newer),
    is: was === undefined ? 'added' : now === undefined ? 'removed' : 'changed',
    quantity: figure?.quantity ?? null,
    was: valueOf(was, figure?.unit ?? null),
    now: valueOf(now, figure?.unit ?? null),
  }
}

/** The same field set from the same to the same in several entries of a list is one change. */
function together(changes: SceneChange[], older: Scene, newer: Scene): SceneChange[] {
  const groups = new Map<string, SceneChange[]>()
  for (const change of changes) {
    const [path] = change.paths
    const entry = path.findIndex((step) => step.startsWith('#'))
    const field = [...path.slice(0, entry), '#', ...path.slice(entry + 1)]
    const inside = entry >= 0 && entry < path.length - 1
    const key = inside ? JSON.stringify([field, change.was, change.now]) : change.key
    groups.set(key, [...(groups.get(key) ?? []), change])
  }
  return [...groups.values()].map((group) => {
    const [first] = group
    if (group.length === 1) return first
    const paths = group.flatMap((change) => change.paths)
    return { ...first, paths, name: manyInWords(first, paths, older, newer) }
  })
}

function manyInWords({ name }: SceneChange, paths: NamedPath[], older: Scene, newer: Scene): string {
  const entry = paths[0].findIndex((step) => step.startsWith('#'))
  const names = paths.map((path) => path[entry].slice(1))
  const owner = placeInWords(paths[0].slice(0, entry + 1), older, newer)
  const kind = owner.slice(0, -names[0].length - 1).toLowerCase()
  const list = valueIn(newer, paths[0].slice(0, entry))
  const whole = Array.isArray(list) && list.length === paths.length
  const who =
    names.length < 4
      ? `${kind}s ${listed(names)}`
      : whole
        ? `all ${names.length} ${kind}s`
        : `${names.length} ${kind}s`
  return name.replace(new RegExp(` of ${kind} .*$`), ` of ${who}`)
}

/** What is seen at display precision, and how many there are below it. */
export function seenChanges<C extends Changed>(changes: readonly C[], system: System) {
  const seen = changes.filter((change) => asShown(change, system).seen)
  return { seen, below: changes.filter((change) => !asShown(change, system).seen) }
}
