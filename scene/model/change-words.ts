import { formatQuantity } from '@/lib/units/format'
import { scaleFor, type Quantity, type System } from '@/lib/units/quantities'
import { toSi, type UnitName } from '@/lib/units/units'
import { nameOf, ORDER, valueIn, type NamedPath } from './differences'
import { capital, fieldInWords, say, unitOf } from './say'
import type { Scene } from './scene'

/** A value that has changed: a figure in SI, words, or nothing where there is none. */
export type Value = number | string | null

/** Something with a name and two values of one kind. */
export interface Changed {
  quantity: Quantity | null
  was: Value
  now: Value
}

const quantityOfUnit: Record<string, Quantity> = {
  mm: 'length',
  kg: 'mass',
  '°': 'angle',
  rpm: 'speed',
  bar: 'pressure',
  J: 'energy',
  'kg mm': 'unbalance',
  'kg mm²': 'inertia',
  'kg m²': 'inertia',
}

/** What a field measures, by the unit its name states; null for words, names and choices. */
export function quantityOf(path: NamedPath): { quantity: Quantity; unit: UnitName } | null {
  const key = path.at(-1) ?? ''
  if (key === 'balanceFactor') return { quantity: 'share', unit: '' }
  const unit = unitOf(key)
  const quantity = quantityOfUnit[unit]
  return quantity ? { quantity, unit: unit as UnitName } : { quantity: 'ratio', unit: '' }
}

const viewWords: Record<string, string> = {
  angleDeg: 'Crank angle',
  speedRpm: 'Speed',
  slowdown: 'Slowed down by',
  reverse: 'Turns backward',
  playing: 'Runs when opened',
  camera: 'Camera',
  hidden: 'Hidden',
  ghost: 'Outlines only',
  sectionAxialMm: 'Section at',
}

/** A changed place in the words of the trade: "Radius of counterweight 4D", "Crank angle". */
export function placeInWords(path: NamedPath, older: Scene, newer: Scene): string {
  const [part, ...rest] = path
  if (part === 'view') return rest[0] ? (viewWords[rest[0]] ?? overlayWords(rest)) : 'How it is looked at'
  if (rest[0] === 'acknowledged') return doubtWords(valueIn(newer, path) ?? valueIn(older, path))
  if (rest.at(-1) === ORDER) return `Order of the ${fieldInWords(rest.slice(0, -1), {})}`
  const scene = valueIn(newer, path) === undefined ? older : newer
  return capital(fieldInWords(indexed(rest, scene.train), scene.train))
}

const overlayWords = (keys: NamedPath) =>
  `Shown: ${keys
    .slice(1)
    .at(-1)!
    .replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`)}`

function doubtWords(doubt: unknown): string {
  const place = typeof doubt === 'object' && doubt !== null && 'path' in doubt ? String(doubt.path) : ''
  return `Stood by: ${fieldInWords(
    place.split('.').map((step) => (/^\d+$/.test(step) ? Number(step) : step)),
    {},
  )}`
}

/** The path with places in lists instead of names. */
export function indexed(path: NamedPath, document: unknown): (string | number)[] {
  let at = document
  return path.map((step) => {
    if (step.startsWith('#') && Array.isArray(at)) {
      const index = at.findIndex((entry) => nameOf(entry) === step)
      at = at[index]
      return index
    }
    at = typeof at === 'object' && at !== null ? (at as Record<string, unknown>)[step] : undefined
    return step
  })
}

/** A value as it is compared and shown: figures in SI, everything else in words. */
export function valueOf(value: unknown, unit: UnitName | null): Value {
  if (value === undefined || value === null) return null
  if (typeof value === 'number') return unit === null ? value : toSi(value, unit)
  if (typeof value === 'boolean') return value ? 'yes' : 'no'
  if (typeof value === 'string') return value
  if (Array.isArray(value)) return listInWords(value)
  return entryInWords(value as Record<string, unknown>)
}

function listInWords(list: readonly unknown[]): string {
  if (list.length === 0) return 'none'
  if (list.length > 24) return `${list.length} points`
  return list
    .map((one) => (typeof one === 'object' ? (nameOf(one) ?? '') : String(one)).replace(/^#/, ''))
    .join('-')
}

/** The figures of a part that has come or gone: "mass 0.6 kg, radius 60 mm". */
function entryInWords(entry: Record<string, unknown>): string {
  if (typeof entry.reason === 'string') return entry.reason
  const words = Object.entries(entry).flatMap(([key, value]) => {
    if (key === 'id' || key === 'format') return []
    if (typeof value === 'number') return [`${fieldInWords([key], entry)} ${say(value, unitOf(key))}`]
    return typeof value === 'string' ? [`${fieldInWords([key], entry)} ${value}`] : []
  })
  return words.length > 0 ? words.join(', ') : 'there'
}

export interface ShownChange {
  was: string
  now: string
  unit: string
  /** False where both read alike: below display precision. */
  seen: boolean
}

/** Both values in one unit at the precision they are shown in. */
export function asShown({ quantity, was, now }: Changed, system: System): ShownChange {
  const numbers = [was, now].filter((value) => typeof value === 'number')
  const most = Math.max(0, ...numbers.map(Math.abs))
  const scale = quantity && numbers.length > 0 ? scaleFor(most, quantity, system) : null
  const text = (value: Value) => {
    if (value === null) return '–'
    if (typeof value === 'string') return value
    return scale && quantity ? formatQuantity(value, quantity, system, undefined, scale).text : String(value)
  }
  const [before, after] = [text(was), text(now)]
  const exact = numbers.length < 2
  return {
    was: before,
    now: exact && before === after ? `${after}, others` : after,
    unit: scale?.unit ?? '',
    seen: exact || before !== after,
  }
}
