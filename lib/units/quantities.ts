import type { UnitName } from './units'

export type System = 'si' | 'us'

/** Decimals, or significant figures. */
export type Digits = { decimals: number } | { significant: number }

/** A unit to show in, used from this SI magnitude on. */
export interface Scale {
  unit: UnitName
  digits: Digits
  from?: number
}

interface QuantitySpec {
  /** With its article, for sentences: "Could not read … as an angle." */
  name: string
  example: string
  /** What may be typed. */
  accepts: UnitName[]
  /** What is shown, ascending by `from`. */
  si: Scale[]
  us: Scale[]
}

const d = (decimals: number): Digits => ({ decimals })
const three: Digits = { significant: 3 }

/** Display precision is that of the trade: 3 significant figures for forces and moments, 0.1 mm, 0.1 g. */
const specs = {
  length: {
    name: 'a length',
    example: '95 mm or 3.74 in',
    accepts: ['mm', 'cm', 'm', 'in', 'ft'],
    si: [{ unit: 'mm', digits: d(1) }],
    us: [{ unit: 'in', digits: d(3) }],
  },
  mass: {
    name: 'a mass',
    example: '388 g or 13.7 oz',
    accepts: ['g', 'kg', 't', 'oz', 'lb'],
    si: [
      { unit: 'g', digits: d(1) },
      { unit: 'kg', digits: d(1), from: 10 },
    ],
    us: [
      { unit: 'oz', digits: d(2) },
      { unit: 'lb', digits: d(1), from: 10 },
    ],
  },
  unbalance: {
    name: 'an unbalance',
    example: '15,400 g mm or 21.4 oz in',
    accepts: ['g mm', 'kg mm', 'oz in'],
    si: [{ unit: 'g mm', digits: d(0) }],
    us: [{ unit: 'oz in', digits: d(2) }],
  },
  coupleUnbalance: {
    name: 'a couple unbalance',
    example: '1,200 g mm²',
    accepts: ['g mm²', 'kg mm²', 'oz in²'],
    si: [{ unit: 'g mm²', digits: d(0) }],
    us: [{ unit: 'oz in²', digits: d(2) }],
  },
  inertia: {
    name: 'a moment of inertia',
    example: '2,889 kg mm² or 0.16 kg m²',
    accepts: ['kg mm²', 'kg m²', 'lb in²', 'lb ft²'],
    si: [
      { unit: 'kg mm²', digits: d(0) },
      { unit: 'kg m²', digits: d(3), from: 0.05 },
    ],
    us: [
      { unit: 'lb in²', digits: d(3) },
      { unit: 'lb ft²', digits: d(3), from: 0.05 },
    ],
  },
  angle: {
    name: 'an angle',
    example: '90 or 90.0°',
    accepts: ['°', 'rad'],
    si: [{ unit: '°', digits: d(1) }],
    us: [{ unit: '°', digits: d(1) }],
  },
  speed: {
    name: 'a speed',
    example: '6,500 rpm',
    accepts: ['rpm', 'rad/s'],
    si: [{ unit: 'rpm', digits: d(0) }],
    us: [{ unit: 'rpm', digits: d(0) }],
  },
  pressure: {
    name: 'a pressure',
    example: '1.05 bar or 15.2 psi',
    accepts: ['bar', 'kPa', 'MPa', 'psi'],
    si: [{ unit: 'bar', digits: d(2) }],
    us: [{ unit: 'psi', digits: d(1) }],
  },
  stress: {
    name: 'a specific load',
    example: '24 MPa',
    accepts: ['MPa', 'psi'],
    si: [{ unit: 'MPa', digits: three }],
    us: [{ unit: 'psi', digits: three }],
  },
  modulus: {
    name: 'a shear modulus',
    example: '79 GPa',
    accepts: ['GPa', 'MPa', 'psi'],
    si: [{ unit: 'GPa', digits: d(1) }],
    us: [{ unit: 'psi', digits: three }],
  },
  force: {
    name: 'a force',
    example: '44 kN or 9,890 lbf',
    accepts: ['N', 'kN', 'lbf'],
    si: [
      { unit: 'N', digits: three },
      { unit: 'kN', digits: three, from: 1000 },
    ],
    us: [{ unit: 'lbf', digits: three }],
  },
  torque: {
    name: 'a moment',
    example: '533 N m or 393 lbf ft',
    accepts: ['N m', 'kN m', 'lbf ft', 'ozf in'],
    si: [
      { unit: 'N m', digits: three },
      { unit: 'kN m', digits: three, from: 10000 },
    ],
    us: [{ unit: 'lbf ft', digits: three }],
  },
  torsionalStiffness: {
    name: 'a torsional stiffness',
    example: '850 kN m/rad',
    accepts: ['N m/rad', 'kN m/rad', 'lbf ft/rad'],
    si: [
      { unit: 'N m/rad', digits: three },
      { unit: 'kN m/rad', digits: three, from: 10000 },
    ],
    us: [{ unit: 'lbf ft/rad', digits: three }],
  },
  energy: {
    name: 'an energy',
    example: '1,641 J',
    accepts: ['J', 'kJ', 'ft lbf'],
    si: [
      { unit: 'J', digits: d(0) },
      { unit: 'kJ', digits: three, from: 1e5 },
    ],
    us: [{ unit: 'ft lbf', digits: d(0) }],
  },
  power: {
    name: 'a power',
    example: '110 kW or 148 hp',
    accepts: ['kW', 'hp'],
    si: [{ unit: 'kW', digits: d(1) }],
    us: [{ unit: 'hp', digits: d(1) }],
  },
  velocity: {
    name: 'a velocity',
    example: '19.1 m/s',
    accepts: ['m/s', 'ft/min', 'ft/s'],
    si: [{ unit: 'm/s', digits: d(1) }],
    us: [{ unit: 'ft/min', digits: d(0) }],
  },
  acceleration: {
    name: 'an acceleration',
    example: '20,400 m/s²',
    accepts: ['m/s²', 'ft/s²'],
    si: [{ unit: 'm/s²', digits: three }],
    us: [{ unit: 'ft/s²', digits: three }],
  },
  volume: {
    name: 'a volume',
    example: '5,001 cm³',
    accepts: ['cm³', 'L', 'in³'],
    si: [
      { unit: 'cm³', digits: d(0) },
      { unit: 'L', digits: d(1), from: 0.1 },
    ],
    us: [{ unit: 'in³', digits: d(1) }],
  },
  share: {
    name: 'a share',
    example: '50 %',
    accepts: ['%'],
    si: [{ unit: '%', digits: d(1) }],
    us: [{ unit: '%', digits: d(1) }],
  },
  ratio: {
    name: 'a number',
    example: '11.4',
    accepts: [''],
    si: [{ unit: '', digits: d(2) }],
    us: [{ unit: '', digits: d(2) }],
  },
  count: {
    name: 'a number',
    example: '8',
    accepts: [''],
    si: [{ unit: '', digits: d(0) }],
    us: [{ unit: '', digits: d(0) }],
  },
} satisfies Record<string, QuantitySpec>

export type Quantity = keyof typeof specs
export const quantities: Record<Quantity, QuantitySpec> = specs

/** The unit and precision in which a value of this size is shown. */
export function scaleFor(magnitude: number, quantity: Quantity, system: System): Scale {
  const scales = quantities[quantity][system]
  let chosen = scales[0]
  for (const scale of scales) if (Math.abs(magnitude) >= (scale.from ?? 0)) chosen = scale
  return chosen
}
