import { plainNumber, withUnit } from '@/lib/units/format'

const unitSuffixes = [
  ['KgMm2', 'kg mm²'],
  ['KgM2', 'kg m²'],
  ['KgMm', 'kg mm'],
  ['Mm', 'mm'],
  ['Kg', 'kg'],
  ['Deg', '°'],
  ['Rpm', 'rpm'],
  ['Bar', 'bar'],
  ['J', 'J'],
] as const

const names: Record<string, string> = {
  id: 'name',
  axialMm: 'axial position',
  'gas.angleDeg': 'angles of the pressure trace',
  'gas.pressureBar': 'pressures of the pressure trace',
  'gas.model': 'gas model',
  boreMm: 'bore',
  offsetMm: 'cylinder offset',
  massKg: 'mass',
  pistonKg: 'piston mass',
  pistonPinKg: 'piston pin mass',
  ringsKg: 'ring mass',
  locksKg: 'lock mass',
  'rod.massKg': 'rod mass',
  'rod.cgFromBigEndMm': 'rod centre of gravity from the big end',
  'rod.inertiaKgMm2': 'rod inertia',
  bigEndBearingKg: 'big end bearing mass',
  crankMassKg: 'crank mass',
  flywheelKgM2: 'flywheel inertia',
  freeEndKgM2: 'free-end inertia',
  idleRpm: 'idle speed',
  ratedRpm: 'rated speed',
  maxRpm: 'greatest speed',
  firesAtDeg: 'firing angle',
  pressureBar: 'pressure',
  wiebeA: 'Wiebe factor a',
  wiebeM: 'Wiebe exponent m',
}

const owners: Record<string, string> = {
  banks: 'bank',
  throws: 'throw',
  cylinders: 'cylinder',
  counterweights: 'counterweight',
  balanceShafts: 'balance shaft',
  mains: 'main bearing',
  collectors: 'collector',
}

/** The unit a key states: "boreMm" is in mm. */
export const unitOf = (key: string) => unitSuffixes.find(([suffix]) => key.endsWith(suffix))?.[1] ?? ''

/** 60 mm, −22.5°, 0.388 kg. */
export const say = (value: number, unit: string) => withUnit(plainNumber(value), unit)

const inWords = (key: string) => {
  const suffix = unitSuffixes.find(([ending]) => key.endsWith(ending))?.[0] ?? ''
  return key.slice(0, key.length - suffix.length).replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`)
}

/** A field in the words of the trade: "rod length of cylinder 3". `document` gives the names of list entries. */
export function fieldInWords(path: readonly PropertyKey[], document: unknown): string {
  const keys = path.filter((step): step is string => typeof step === 'string')
  const key = keys.at(-1)
  if (key === undefined) return 'document'
  const words = names[keys.slice(-2).join('.')] ?? names[key] ?? inWords(key)
  const entry = path.findIndex((step, index) => index > 0 && typeof step === 'number')
  if (entry < 0) return words
  const list = String(path[entry - 1])
  const place = Number(path[entry])
  if (!(list in owners)) return `point ${place + 1} of the ${words}`
  const owner = `${owners[list]} ${entryName(path.slice(0, entry + 1), document) ?? place + 1}`
  if (entry === path.length - 1) return owner
  return `${words} of ${owner}`
}

function entryName(path: readonly PropertyKey[], document: unknown): string | undefined {
  const entry = valueAt(path, document)
  const id = typeof entry === 'object' && entry !== null ? (entry as { id?: unknown }).id : undefined
  return typeof id === 'string' && id.length > 0 && id.length <= 40 ? id : undefined
}

export const valueAt = (path: readonly PropertyKey[], document: unknown): unknown =>
  path.reduce<unknown>(
    (value, step) =>
      typeof value === 'object' && value !== null && Object.hasOwn(value, step)
        ? (value as Record<PropertyKey, unknown>)[step]
        : undefined,
    document,
  )

export const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1)

/** "1, 3 and 4". */
export const listed = (items: readonly (string | number)[]) =>
  items.length < 2 ? items.join('') : `${items.slice(0, -1).join(', ')} and ${items[items.length - 1]}`
