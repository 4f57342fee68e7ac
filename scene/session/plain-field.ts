import type { Quantity } from '@/lib/units/quantities'
import type { UnitName } from '@/lib/units/units'
import { quantityField, type QuantityField, type QuantityFieldOptions } from './field'
import { getAt, type Path, type ScenePath } from './path'

/** A field that reads and writes one number of the train. */
export function plainField(
  path: Path,
  label: string,
  quantity: Quantity,
  documentUnit: UnitName,
  more: Partial<QuantityFieldOptions> = {},
): QuantityField {
  const full: ScenePath = ['train', ...path]
  return quantityField({
    key: path.join('.'),
    label,
    quantity,
    documentUnit,
    path: path.join('.'),
    get: (scene) => getAt(scene, full) as number | undefined,
    changes: (value) => [{ path: full, value }],
    ...more,
  })
}
