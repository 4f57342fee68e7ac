import { convert, type UnitName } from '@/lib/units/units'
import { formatNumber, plainNumber } from '@/lib/units/format'
import { parseQuantity, type Mend as TextMend } from '@/lib/units/parse'
import { scaleFor, type Quantity, type Scale, type System } from '@/lib/units/quantities'
import type { Scene } from '@/scene/model/scene'
import type { Change } from './path'

/** An offered repair: this text in the field, or these changes of the document. */
export type Mend = TextMend | { label: string; changes: Change[] }

/** A value that can be read and is probably not what was meant: the drawing keeps the last one and asks. */
export interface Doubt {
  head: string
  message: string
  mends: Mend[]
  /** "Keep 0.388 g" */
  keep: string
}

export type Reading =
  | { ok: true; changes: Change[]; understood?: string; doubt?: Doubt | null }
  | { ok: false; message: string; mends: Mend[] }

/** One entry of the parts list, as the session needs it: how typed text becomes changes of the document. */
export interface Field {
  key: string
  /** Names it in the list of refused values: "Rod, centres". */
  label: string
  read(text: string, scene: Scene, system: System): Reading
}

export interface Shown {
  text: string
  unit: string
}

export interface QuantityFieldOptions {
  key: string
  label: string
  quantity: Quantity
  /** The unit of the document's own number. */
  documentUnit: UnitName
  path?: string
  get(scene: Scene): number | undefined
  changes(value: number | undefined, scene: Scene): Change[]
  optional?: boolean
  /** Why a value can never be, or null; what depends on other values is judged with the document. */
  refuse?(value: number, typed: Typed): { message: string; mends: Mend[] } | null
  /** Judges a value in document units as typed with no suffix; see usual.ts. */
  doubt?(value: number, scene: Scene, typed: Typed): Doubt | null
}

/** What was read of a text, before it is turned into the document's unit. */
export interface Typed {
  number: number
  unit: UnitName
  system: System
}

export interface QuantityField extends Field {
  quantity: Quantity
  /** Where the document holds the number, dotted from the train, where it is one place. */
  path?: string
  get(scene: Scene): number | undefined
  show(scene: Scene, system: System): Shown
  changes: QuantityFieldOptions['changes']
  refuse: QuantityFieldOptions['refuse']
  doubt: QuantityFieldOptions['doubt']
}

/** A field for one figure of the document. */
export function quantityField(options: QuantityFieldOptions): QuantityField {
  const { key, label, quantity, documentUnit, path, get, changes, optional, refuse, doubt } = options
  const scaleOf = (scene: Scene, system: System): Scale => {
    const value = get(scene)
    return scaleFor(value === undefined ? 0 : convert(value, documentUnit, baseUnit), quantity, system)
  }
  return {
    key,
    label,
    quantity,
    path,
    get,
    changes,
    refuse,
    doubt,
    show(scene, system) {
      const value = get(scene)
      const scale = scaleOf(scene, system)
      if (value === undefined) return { text: '', unit: scale.unit }
      return { text: fieldText(convert(value, documentUnit, scale.unit), scale), unit: scale.unit }
    },
    read(text, scene, system) {
      if (optional && text.trim() === '') return { ok: true, changes: changes(undefined, scene) }
      const shown = scaleOf(scene, system).unit
      const parsed = parseQuantity(text, quantity, shown)
      if (!parsed.ok) return { ok: false, message: parsed.message, mends: parsed.mends }
      const value = convert(parsed.number, parsed.unit, documentUnit)
      const typed = { number: parsed.number, unit: parsed.unit, system }
      const refused = refuse?.(value, typed)
      if (refused) return { ok: false, ...refused }
      const understood =
        parsed.unit === shown && !/[^\d.+-]/.test(text.trim())
          ? undefined
          : plainNumber(Number(convert(parsed.number, parsed.unit, shown).toPrecision(6)))
      return { ok: true, changes: changes(value, scene), understood, doubt: doubt?.(value, scene, typed) }
    },
  }
}

const baseUnit: UnitName = ''

/** The usual decimals, or up to two more where they write the value exactly: 43.68 mm stays, 3.7401575 in becomes 3.740. */
function fieldText(value: number, scale: Scale): string {
  const usual = 'decimals' in scale.digits ? scale.digits.decimals : 1
  for (let decimals = usual; decimals <= usual + 2; decimals++)
    if (Math.abs(Number(value.toFixed(decimals)) - value) <= 1e-9 * Math.abs(value))
      return formatNumber(value, { decimals })
  return formatNumber(value, { decimals: usual })
}
