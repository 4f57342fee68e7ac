import type { UnitName } from '@/lib/units/units'
import type { CrankTrain } from '@/scene/model/crank-train'
import type { Scene } from '@/scene/model/scene'
import type { QuantityField } from '@/scene/session/field'
import type { Change, ScenePath } from '@/scene/session/path'
import { plainField } from '@/scene/session/plain-field'
import { fields } from './fields'

type Own = 'boreMm' | 'strokeMm' | 'rodLengthMm' | 'offsetMm' | 'compressionRatio' | MassName
type MassName = 'pistonKg' | 'pistonPinKg' | 'ringsKg' | 'locksKg' | 'bigEndBearingKg' | 'oilAllowanceKg'
type RodPart = 'massKg' | 'cgFromBigEndMm' | 'inertiaKgMm2'

interface OwnSpec {
  /** The field for all cylinders, whose name and usual range hold here too. */
  common: QuantityField
  unit: UnitName
  at: [Own] | ['rod', RodPart]
}

/** What a cylinder may have otherwise than the rest, in the order of the parts list. */
const specs: OwnSpec[] = [
  { common: fields.bore, unit: 'mm', at: ['boreMm'] },
  { common: fields.stroke, unit: 'mm', at: ['strokeMm'] },
  { common: fields.rodLength, unit: 'mm', at: ['rodLengthMm'] },
  { common: fields.offset, unit: 'mm', at: ['offsetMm'] },
  { common: fields.compressionRatio, unit: '', at: ['compressionRatio'] },
  { common: fields.piston, unit: 'kg', at: ['pistonKg'] },
  { common: fields.pistonPin, unit: 'kg', at: ['pistonPinKg'] },
  { common: fields.rings, unit: 'kg', at: ['ringsKg'] },
  { common: fields.locks, unit: 'kg', at: ['locksKg'] },
  { common: fields.rod, unit: 'kg', at: ['rod', 'massKg'] },
  { common: fields.rodCentre, unit: 'mm', at: ['rod', 'cgFromBigEndMm'] },
  { common: fields.rodInertia, unit: 'kg mm²', at: ['rod', 'inertiaKgMm2'] },
  { common: fields.bearing, unit: 'kg', at: ['bigEndBearingKg'] },
  { common: fields.oil, unit: 'kg', at: ['oilAllowanceKg'] },
]

/** One value of one cylinder. */
export interface OwnField {
  field: QuantityField
  common: QuantityField
  cylinder: number
  /** Back to what holds for all. */
  reset(scene: Scene): Change[]
}

export const ownNames = specs.map(({ common }, index) => ({ index, name: common.label }))

/** The value `which` of cylinder `cylinder`, as a field. */
export function ownField(which: number, cylinder: number): OwnField {
  const { common, unit, at } = specs[which]
  const entry: ScenePath = ['train', 'cylinders', cylinder]
  const [name, part] = at
  const set = (train: CrankTrain, value: number | undefined): Change[] => {
    if (name !== 'rod') return [{ path: [...entry, name], value }]
    const rod = { ...(train.cylinders[cylinder].rod ?? train.masses.rod) } as Record<string, unknown>
    if (value === undefined) delete rod[part!]
    else rod[part!] = value
    return [{ path: [...entry, 'rod'], value: rod }]
  }
  const field = plainField(
    ['cylinders', cylinder, ...at],
    `${common.label}, cylinder ${cylinder + 1}`,
    common.quantity,
    unit,
    {
      changes: (value, { train }) => set(train, value),
      optional: part === 'inertiaKgMm2',
      refuse: common.refuse,
      doubt: common.doubt,
    },
  )
  return { field, common, cylinder, reset: ({ train }) => resetOf(train) }

  function resetOf(train: CrankTrain): Change[] {
    if (name !== 'rod') return [{ path: [...entry, name], value: undefined }]
    const all = train.masses.rod as Record<string, unknown> | undefined
    const rod = { ...train.cylinders[cylinder].rod, [part!]: all?.[part!] } as Record<string, unknown>
    const parts: RodPart[] = ['massKg', 'cgFromBigEndMm', 'inertiaKgMm2']
    const same = all !== undefined && parts.every((each) => rod[each] === all[each])
    return [{ path: [...entry, 'rod'], value: same ? undefined : rod }]
  }
}

/** A cylinder's own value begins as the common one. */
export function differ(which: number, cylinder: number, scene: Scene): Change[] {
  const { common } = specs[which]
  return ownField(which, cylinder).field.changes(common.get(scene) ?? 0, scene)
}

const states = (train: CrankTrain, { at: [name] }: OwnSpec, cylinder: number) =>
  train.cylinders[cylinder][name] !== undefined

/** Whether a cylinder has the value `which` of its own. */
export const statesOwn = (train: CrankTrain, which: number, cylinder: number) =>
  states(train, specs[which], cylinder)

/** Everything that cylinders state for themselves. */
export const ownValues = (train: CrankTrain): OwnField[] =>
  train.cylinders.flatMap((_, cylinder) =>
    specs.flatMap((spec, which) => (states(train, spec, cylinder) ? [ownField(which, cylinder)] : [])),
  )

/** Cylinders that do not have the common value of a field, by name. */
export function exceptions(train: CrankTrain, field: QuantityField): string[] {
  const spec = specs.find(({ common }) => common.key === field.key)
  return spec ? train.cylinders.flatMap(({ id }, i) => (states(train, spec, i) ? [id] : [])) : []
}
