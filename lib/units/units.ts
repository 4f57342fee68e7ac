/**
 * Every unit that can be typed or shown: SI value of one unit, and the ways it is written.
 *
 * Exact by definition: inch 25.4 mm and pound 0.45359237 kg (international yard and pound agreement, 1959),
 * standard gravity 9.80665 m/s² (3rd General Conference on Weights and Measures, 1901), bar 100 kPa. The rest follow from these.
 */
const inch = 0.0254
const foot = 12 * inch
const pound = 0.45359237
const ounce = pound / 16
/** m/s². */
export const standardGravity = 9.80665
const poundForce = pound * standardGravity

const unit = (factor: number, ...written: string[]) => ({ factor, written })

export const units = {
  mm: unit(1e-3, 'mm', 'millimetre', 'millimetres', 'millimeter', 'millimeters'),
  cm: unit(1e-2, 'cm'),
  m: unit(1, 'm', 'metre', 'metres'),
  in: unit(inch, 'in', '"', 'inch', 'inches', 'in.'),
  ft: unit(foot, 'ft', "'", 'foot', 'feet'),
  g: unit(1e-3, 'g', 'gram', 'grams'),
  kg: unit(1, 'kg', 'kilogram', 'kilograms'),
  t: unit(1000, 't', 'tonne', 'tonnes'),
  oz: unit(ounce, 'oz', 'ounce', 'ounces'),
  lb: unit(pound, 'lb', 'lbs', 'pound', 'pounds'),
  'g mm': unit(1e-6, 'g mm', 'gmm', 'g·mm'),
  'kg mm': unit(1e-3, 'kg mm', 'kgmm', 'kg·mm'),
  'oz in': unit(ounce * inch, 'oz in', 'ozin', 'oz·in', 'in oz'),
  'g mm²': unit(1e-9, 'g mm²', 'g mm2', 'gmm2'),
  'kg mm²': unit(1e-6, 'kg mm²', 'kg mm2', 'kgmm2'),
  'kg m²': unit(1, 'kg m²', 'kg m2', 'kgm2'),
  'oz in²': unit(ounce * inch * inch, 'oz in²', 'oz in2'),
  'lb in²': unit(pound * inch * inch, 'lb in²', 'lb in2'),
  'lb ft²': unit(pound * foot * foot, 'lb ft²', 'lb ft2'),
  '°': unit(Math.PI / 180, '°', 'deg', 'degree', 'degrees'),
  rad: unit(1, 'rad'),
  rpm: unit((2 * Math.PI) / 60, 'rpm', '1/min', 'r/min', '/min'),
  'rad/s': unit(1, 'rad/s'),
  bar: unit(1e5, 'bar'),
  kPa: unit(1e3, 'kpa'),
  MPa: unit(1e6, 'mpa'),
  GPa: unit(1e9, 'gpa'),
  psi: unit(poundForce / (inch * inch), 'psi'),
  N: unit(1, 'n'),
  kN: unit(1e3, 'kn'),
  lbf: unit(poundForce, 'lbf'),
  'N m': unit(1, 'n m', 'nm', 'n·m'),
  'kN m': unit(1e3, 'kn m', 'knm'),
  'ozf in': unit((poundForce / 16) * inch, 'ozf in', 'in ozf'),
  'lbf ft': unit(poundForce * foot, 'lbf ft', 'lb ft', 'ft lbf', 'ft lb'),
  'N m/rad': unit(1, 'n m/rad', 'nm/rad', 'n·m/rad'),
  'kN m/rad': unit(1e3, 'kn m/rad', 'knm/rad'),
  'lbf ft/rad': unit(poundForce * foot, 'lbf ft/rad', 'lb ft/rad', 'ft lbf/rad'),
  J: unit(1, 'j'),
  kJ: unit(1e3, 'kj'),
  'ft lbf': unit(poundForce * foot, 'ft lbf', 'ft lb'),
  kW: unit(1e3, 'kw'),
  hp: unit(550 * foot * poundForce, 'hp'),
  'm/s': unit(1, 'm/s'),
  'ft/min': unit(foot / 60, 'ft/min'),
  'ft/s': unit(foot, 'ft/s'),
  'm/s²': unit(1, 'm/s²', 'm/s2'),
  'ft/s²': unit(foot, 'ft/s²', 'ft/s2'),
  'cm³': unit(1e-6, 'cm³', 'cm3', 'cc'),
  L: unit(1e-3, 'l', 'litre', 'litres'),
  'in³': unit(inch ** 3, 'in³', 'in3', 'cu in'),
  '%': unit(0.01, '%', 'percent'),
  '': unit(1, ''),
} as const

export type UnitName = keyof typeof units

/**
 * Converts between two units of one quantity. The same unit gives the same number; otherwise the last bit of the
 * doubles is rounded off (15 figures), so that 95 mm stays 95 and not 94.99999999999999.
 */
export function convert(value: number, from: UnitName, to: UnitName): number {
  if (units[from].factor === units[to].factor) return value
  return Number(((value * units[from].factor) / units[to].factor).toPrecision(15))
}

/** `value` SI units in this unit, with the last bit of the doubles rounded off. */
export const fromSi = (value: number, to: UnitName): number => convert(value, '', to)
export const toSi = (value: number, from: UnitName): number => convert(value, from, '')
