import { units, type UnitName } from './units'

/** In what unit of the SI (or accepted beside it) a figure leaves for a file, by the unit it is shown in. */
const written: Partial<Record<UnitName, UnitName>> = {
  cm: 'mm',
  m: 'mm',
  in: 'mm',
  ft: 'mm',
  g: 'kg',
  t: 'kg',
  oz: 'kg',
  lb: 'kg',
  'g mm': 'kg mm',
  'oz in': 'kg mm',
  'g mm²': 'kg mm²',
  'oz in²': 'kg mm²',
  'lb in²': 'kg m²',
  'lb ft²': 'kg m²',
  rad: '°',
  'rad/s': 'rpm',
  kPa: 'bar',
  psi: 'bar',
  kN: 'N',
  lbf: 'N',
  'kN m': 'N m',
  'lbf ft': 'N m',
  'kN m/rad': 'N m/rad',
  'lbf ft/rad': 'N m/rad',
  kJ: 'J',
  'ft lbf': 'J',
  hp: 'kW',
  'ft/min': 'm/s',
  'ft/s': 'm/s',
  'ft/s²': 'm/s²',
  L: 'cm³',
  'in³': 'cm³',
}

/** The unit of files and the factor from the shown one; nothing where they are the same. */
export function fileUnit(shown: UnitName): { unit: UnitName; factor: number } | undefined {
  const unit = written[shown]
  if (unit === undefined) return undefined
  return { unit, factor: Number((units[shown].factor / units[unit].factor).toPrecision(15)) }
}
