import { bobWeights, massSplit, permissibleUnbalance } from '../balance'
import type { Engine } from './engine'
import { symbol, type Draft } from './explanation'
import { handbook, twoMass } from './words'

const MM = 1000
const GMM = 1e6
/** Below this share of the unbalances that cancel, what is left is rounding. */
const ROUNDING = 1e-13

/** The rod's share is its mass by the lever rule about its centre of gravity. */
function split({ train, cylinder }: Engine) {
  const { rod, rodLength, pistonMass, bigEndBearing } = train.cylinders[cylinder]
  return {
    piston: symbol('piston', 'piston, pin, rings and locks', pistonMass, 'kg'),
    rodMass: symbol('rod mass', 'whole rod', rod.mass, 'kg'),
    centre: symbol('centre', 'centre of gravity from the big end', rod.cgFromBigEnd * MM, 'mm'),
    rod: symbol('rod', 'rod length between centres', rodLength * MM, 'mm'),
    bearing: symbol('bearing', 'big-end bearing', bigEndBearing, 'kg'),
  }
}

export function reciprocatingMass(engine: Engine): Draft {
  const { piston, rodMass, centre, rod } = split(engine)
  return {
    title: 'Reciprocating mass',
    quantity: 'mass',
    unit: 'kg',
    formula: 'piston + rod mass × centre / rod',
    symbols: [piston, rodMass, centre, rod],
    assumptions: [twoMass],
    source: handbook,
  }
}

export function rotatingMass(engine: Engine): Draft {
  const { rodMass, centre, rod, bearing } = split(engine)
  return {
    title: 'Rotating mass',
    quantity: 'mass',
    unit: 'kg',
    formula: 'bearing + rod mass × (rod − centre) / rod',
    symbols: [bearing, rodMass, rod, centre],
    assumptions: [twoMass],
    source: handbook,
  }
}

export function bobWeight({ train, pin }: Engine): Draft {
  const { rotating, reciprocating, oil } = bobWeights(train)[pin]
  return {
    title: `Bob-weight of throw ${train.throws[pin].id}`,
    quantity: 'mass',
    unit: 'kg',
    formula: 'rotating + oil + factor × reciprocating',
    symbols: [
      symbol('rotating', 'big ends and bearings on this pin', rotating, 'kg'),
      symbol('oil', 'oil allowance of this pin', oil, 'kg'),
      symbol('factor', 'balance factor, share of all the reciprocating mass on the pin', train.balanceFactor),
      symbol('reciprocating', 'pistons and small ends on this pin', reciprocating, 'kg'),
    ],
    assumptions: [twoMass],
    source: handbook,
  }
}

/** The factor back from the bob-weight, with the other definition beside it. */
export function balanceFactor({ train, pin }: Engine): Draft {
  const { mass, rotating, reciprocating, oil } = bobWeights(train)[pin]
  const on = train.cylinders.map((each, i) => ({ each, i })).filter(({ each }) => each.throw === pin)
  const one = Math.max(...on.map(({ each }) => massSplit(each).reciprocating))
  return {
    title: 'Balance factor',
    quantity: 'share',
    unit: '%',
    formula: '100 × (bob-weight − rotating − oil) / reciprocating',
    symbols: [
      symbol('bob-weight', 'what hangs on the pin', mass, 'kg'),
      symbol('rotating', 'big ends and bearings on this pin', rotating, 'kg'),
      symbol('oil', 'oil allowance of this pin', oil, 'kg'),
      symbol('reciprocating', 'pistons and small ends on this pin', reciprocating, 'kg'),
    ],
    assumptions: ['Share of all the reciprocating mass on the pin, of every cylinder that shares it.'],
    source: handbook,
    beside: {
      name: 'As a share of one cylinder’s',
      value: (100 * train.balanceFactor * reciprocating) / one,
      unit: '%',
    },
  }
}

/** Sums of unbalance by what carries it, straight up and to +90°, g mm; with `arm` a couple, g mm². */
export function unbalances({ train }: Engine, arm: boolean) {
  const lever = (axial: number) => (arm ? (axial - train.referenceAxial) * MM : 1)
  const weights = bobWeights(train)
  const groups = {
    throws: train.throws.map((pin) => ({ ...pin, size: pin.unbalance })),
    counterweights: train.counterweights.map((each) => ({ ...each, size: each.mass * each.radius })),
    'bob-weights': train.throws.map((pin, i) => ({
      ...pin,
      size: (weights[i].mass - weights[i].oil) * pin.radius,
    })),
  }
  const total = (
    list: { angle: number; axial: number; size: number }[],
    along: (angle: number) => number,
  ) => {
    const parts = list.map(({ angle, axial, size }) => size * GMM * lever(axial) * along(angle))
    const left = parts.reduce((sum, part) => sum + part, 0)
    const whole = list.reduce((sum, { axial, size }) => sum + Math.abs(size * GMM * lever(axial)), 0)
    return Math.abs(left) <= ROUNDING * whole ? 0 : left
  }
  return Object.entries(groups).map(([name, list]) => ({
    name,
    up: total(list, Math.cos),
    aside: total(list, Math.sin),
  }))
}

function residual(engine: Engine, couple: boolean): Draft {
  const unit = couple ? 'g mm²' : 'g mm'
  const of = couple ? 'mass × radius × place' : 'mass × radius'
  const groups = unbalances(engine, couple)
  return {
    title: couple ? 'Residual couple' : 'Residual static unbalance',
    quantity: couple ? 'coupleUnbalance' : 'unbalance',
    unit,
    formula: `root((${groups.map(({ name }) => `${name} up`).join(' + ')})² + (${groups.map(({ name }) => `${name} aside`).join(' + ')})²)`,
    symbols: groups.flatMap(({ name, up, aside }) => [
      symbol(`${name} up`, `${of} of the ${name}, towards 0°`, up, unit),
      symbol(`${name} aside`, `${of} of the ${name}, towards +90°`, aside, unit),
    ]),
    assumptions: [
      'Bare crank with bob-weights on its pins; the oil allowance is left out.',
      ...(couple ? ['Places are counted from the reference place of the couples.'] : []),
      twoMass,
    ],
    source: handbook,
  }
}

export const residualStatic = (engine: Engine) => residual(engine, false)
export const residualCouple = (engine: Engine) => residual(engine, true)

export function permissibleResidual({ train, plan, asked }: Engine): Draft {
  if (train.crankMass === undefined) throw new RangeError('The crank mass is not given.')
  const speed = train.operating.max ?? plan.speed
  const grade = asked.gradeMmS ?? 16
  if (permissibleUnbalance(train.crankMass, grade / 1000, speed) === null)
    throw new RangeError('At 0 rpm no unbalance is too much.')
  return {
    title: 'Permissible residual unbalance',
    quantity: 'unbalance',
    unit: 'g mm',
    formula: '1000 × mass × grade / speed',
    symbols: [
      symbol('mass', 'crank mass', train.crankMass, 'kg'),
      symbol('grade', 'balance quality grade G', grade, 'mm/s'),
      symbol(
        'speed',
        train.operating.max === undefined ? 'crank speed' : 'greatest crank speed',
        speed,
        'rad/s',
      ),
    ],
    assumptions: ['For the whole crank; half of it in each of two planes where they stand alike.'],
    source: 'ISO 21940-11:2016, permissible residual unbalance.',
  }
}
