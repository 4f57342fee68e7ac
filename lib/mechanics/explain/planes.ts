import { permissibleUnbalance } from '../balance'
import { bearingPlanes, toleranceShares } from '../balance/two-planes'
import { unbalances } from './balance'
import type { Engine } from './engine'
import { symbol, type Draft } from './explanation'
import { handbook, twoMass } from './words'

const MM = 1000

/** The plane asked about and the other one, m: those asked for, or the outermost bearings. Throws RangeError for one place. */
function placesOf({ asked, train }: Engine): [number, number] {
  const [a, b] = bearingPlanes(train) ?? []
  const own = asked.planeMm === undefined ? a : asked.planeMm / MM
  const other = asked.otherPlaneMm === undefined ? b : asked.otherPlaneMm / MM
  if (own === undefined || other === undefined || own === other)
    throw new RangeError('Two planes at different places are not given.')
  return [own, other]
}

/** U = (C − other·F) / (own − other): what a balancing machine shows in one of two planes. */
export function planeResidual(engine: Engine): Draft {
  const [own, other] = placesOf(engine)
  const sum = (arm: boolean, along: 'up' | 'aside') =>
    unbalances(engine, arm).reduce((total, one) => total + one[along], 0)
  const place = (other - engine.train.referenceAxial) * MM
  return {
    title: `Residual in the plane at ${Number((own * MM).toFixed(1))} mm`,
    quantity: 'unbalance',
    unit: 'g mm',
    formula: 'root((couple up − other × static up)² + (couple aside − other × static aside)²) / apart',
    symbols: [
      symbol('couple up', 'mass × radius × place of all that turns, towards 0°', sum(true, 'up'), 'g mm²'),
      symbol('other', 'place of the other plane from the reference place', place, 'mm'),
      symbol('static up', 'mass × radius of all that turns, towards 0°', sum(false, 'up'), 'g mm'),
      symbol('couple aside', 'the couple, towards +90°', sum(true, 'aside'), 'g mm²'),
      symbol('static aside', 'mass × radius, towards +90°', sum(false, 'aside'), 'g mm'),
      symbol('apart', 'distance between the planes', Math.abs(own - other) * MM, 'mm'),
    ],
    assumptions: [
      'Bare crank with bob-weights on its pins; the oil allowance is left out.',
      'Places are counted from the reference place of the couples.',
      twoMass,
    ],
    source: handbook,
  }
}

/** The plane's share of what the whole crank may have. */
export function planePermissible(engine: Engine): Draft {
  const { train, asked } = engine
  const [own, other] = placesOf(engine)
  const grade = asked.gradeMmS ?? 16
  if (train.crankMass === undefined) throw new RangeError('The crank mass is not given.')
  const speed = train.operating.max ?? engine.plan.speed
  if (permissibleUnbalance(train.crankMass, grade / 1000, speed) === null)
    throw new RangeError('At 0 rpm no unbalance is too much.')
  const [share] = toleranceShares(own, other, (own + other) / 2)
  return {
    title: `Allowed in the plane at ${Number((own * MM).toFixed(1))} mm`,
    quantity: 'unbalance',
    unit: 'g mm',
    formula: 'share × 1000 × mass × grade / speed',
    symbols: [
      symbol('share', 'of this plane in what the whole crank may have', share),
      symbol('mass', 'crank mass', train.crankMass, 'kg'),
      symbol('grade', 'balance quality grade G', grade, 'mm/s'),
      symbol(
        'speed',
        train.operating.max === undefined ? 'crank speed' : 'greatest crank speed',
        speed,
        'rad/s',
      ),
    ],
    assumptions: ['The crank’s centre of gravity is taken half-way between the planes.'],
    source: 'ISO 21940-11:2016, permissible residual unbalance and its split between two planes.',
  }
}
