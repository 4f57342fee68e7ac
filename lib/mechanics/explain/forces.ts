import { massSplit } from '../balance'
import type { Engine } from './engine'
import { symbol, type Draft } from './explanation'
import { handbook, massless, newton, steady, twoMass } from './words'

const MPA = 1e-6
const MM = 1000

export function gasForce({ train, instant, cylinder }: Engine): Draft {
  return {
    title: 'Gas force',
    quantity: 'force',
    unit: 'N',
    formula: '(pressure − crankcase) × pi / 4 × bore²',
    symbols: [
      symbol('pressure', 'pressure over the piston, absolute', instant.pressure[cylinder] * MPA, 'MPa'),
      symbol('crankcase', 'pressure under the piston, absolute', train.crankcasePressure * MPA, 'MPa'),
      symbol('bore', 'bore', train.cylinders[cylinder].bore * MM, 'mm'),
    ],
    assumptions: [
      'Positive towards the crank.',
      train.gas.model === 'heat-release'
        ? 'The pressure is a single-zone estimate from the heat given.'
        : train.gas.model === 'trace'
          ? 'The pressure is read off the given trace, linear between its points.'
          : 'No gas model is given: both pressures are the crankcase’s.',
    ],
    source: handbook,
  }
}

/** What a rod's own mass, and its bearing's, does along and across the cylinder, N, and about its big end, N m. */
function rodInertia({ plan, instant, cylinder: i }: Engine) {
  const { motion } = instant
  const { rod, bigEndBearing } = plan.train.cylinders[i]
  const [sin, cos, turn1, turn2] = [motion.sin[i], motion.cos[i], motion.angle1[i], motion.angle2[i]]
  const h = rod.cgFromBigEnd
  const up = motion.bigEndU2[i] - h * (cos * turn1 * turn1 + sin * turn2)
  const across = motion.bigEndV2[i] + h * (sin * turn1 * turn1 - cos * turn2)
  const square = plan.speed ** 2
  return {
    up: -(rod.mass * up + bigEndBearing * motion.bigEndU2[i]) * square,
    across: -(rod.mass * across + bigEndBearing * motion.bigEndV2[i]) * square,
    moment: (rod.mass * h * (cos * across + sin * up) - rod.inertia * turn2) * square,
  }
}

/** What links put on a master rod, in its cylinder's frame, N. */
function linkForce({ plan, instant, cylinder: i }: Engine) {
  const { cosBank, sinBank } = plan.paths[i]
  const { vertical, horizontal } = instant.carried
  return {
    up: vertical[i] * cosBank + horizontal[i] * sinBank,
    across: horizontal[i] * cosBank - vertical[i] * sinBank,
  }
}

const pistonMass = ({ train, cylinder }: Engine) =>
  symbol('piston mass', 'piston, pin, rings and locks', train.cylinders[cylinder].pistonMass, 'kg')
const pistonAcceleration = ({ instant, cylinder }: Engine) =>
  symbol('acceleration', 'of the piston, away from the crank', instant.acceleration[cylinder], 'm/s²')
const gas = ({ instant, cylinder }: Engine) =>
  symbol('gas force', 'on the piston, towards the crank', instant.gasForce[cylinder], 'N')

export function sideThrust(engine: Engine): Draft {
  const { plan, instant, cylinder, train } = engine
  const lean = symbol('rod angle', 'angle of the rod', (instant.rodAngle[cylinder] * 180) / Math.PI, '°')
  const linked = instant.carried.moment[cylinder] !== 0
  return {
    title: 'Side thrust',
    quantity: 'force',
    unit: 'N',
    formula: `−(gas force + piston mass × acceleration) × tan(rod angle) − (rod moment${linked ? ' − link moment' : ''}) / (rod × cos(rod angle))`,
    symbols: [
      gas(engine),
      pistonMass(engine),
      pistonAcceleration(engine),
      lean,
      symbol('rod moment', 'of the rod’s own inertia about its big end', rodInertia(engine).moment, 'N m'),
      ...(linked
        ? [
            symbol(
              'link moment',
              'of the link rods about the big end',
              instant.carried.moment[cylinder],
              'N m',
            ),
          ]
        : []),
      symbol('rod', 'rod length between centres', plan.paths[cylinder].length, 'm'),
    ],
    assumptions: [
      `The piston on its wall, positive towards +90° from the cylinder.`,
      train.cylinders[cylinder].rod.rigid
        ? 'The rod is a rigid body with the inertia given.'
        : 'The rod’s own inertia is not given: it is taken as two masses.',
      steady,
      massless,
    ],
    source: newton,
  }
}

/** The rod with its bearing on the crank pin, or a link rod on its knuckle. */
export function rodLoad(engine: Engine): Draft {
  const { instant, cylinder, plan } = engine
  const inertia = rodInertia(engine)
  const links = linkForce(engine)
  const linked = links.up !== 0 || links.across !== 0
  return {
    title: plan.paths[cylinder].master < 0 ? 'Rod on its crank pin' : 'Link rod on its knuckle',
    quantity: 'force',
    unit: 'N',
    formula: linked
      ? 'root((rod up + link up − gas force − piston mass × acceleration)² + (rod across + link across − side thrust)²)'
      : 'root((rod up − gas force − piston mass × acceleration)² + (rod across − side thrust)²)',
    symbols: [
      symbol('rod up', 'inertia of rod and bearing along the cylinder', inertia.up, 'N'),
      symbol('rod across', 'the same across it', inertia.across, 'N'),
      ...(linked
        ? [
            symbol('link up', 'what the link rods put on it, along the cylinder', links.up, 'N'),
            symbol('link across', 'the same across it', links.across, 'N'),
          ]
        : []),
      gas(engine),
      pistonMass(engine),
      pistonAcceleration(engine),
      symbol('side thrust', 'of the piston on its wall', instant.sideThrust[cylinder], 'N'),
    ],
    assumptions: ['Size of the force at this crank angle; its bearing is part of the rod.', steady, massless],
    source: newton,
  }
}

/** Mass × throw × speed² of the reciprocating parts of one cylinder: the measure of the first order. */
export function firstOrder(engine: Engine): Draft {
  const { train, cylinder, pin, plan } = engine
  return {
    title: 'First-order force of one cylinder',
    quantity: 'force',
    unit: 'N',
    formula: 'reciprocating × throw × speed²',
    symbols: [
      symbol(
        'reciprocating',
        'mass that goes with the piston, with its share of the rod',
        massSplit(train.cylinders[cylinder]).reciprocating,
        'kg',
      ),
      symbol('throw', 'throw radius, half the stroke', train.throws[pin].radius, 'm'),
      symbol('speed', 'crank speed', plan.speed, 'rad/s'),
    ],
    assumptions: ['First term of the textbook series; the exact signal holds a little more.', steady],
    source: handbook,
  }
}

export function secondOrder(engine: Engine): Draft {
  const { train, cylinder, pin } = engine
  const first = firstOrder(engine)
  return {
    ...first,
    title: 'Second-order force of one cylinder',
    formula: 'reciprocating × throw × speed² × throw / rod',
    symbols: [
      ...first.symbols,
      symbol('rod', 'rod length between centres', train.cylinders[cylinder].rodLength, 'm'),
    ],
    beside: {
      name: 'Exact to the fifth power of throw to rod',
      unit: 'N',
      value: exactSecond(engine, train.throws[pin].radius / train.cylinders[cylinder].rodLength),
    },
  }
}

/** A2 = λ + λ³/4 + 15λ⁵/128 of the binomial series, times the first-order force. */
function exactSecond({ train, cylinder, pin, plan }: Engine, lambda: number): number {
  const mass = massSplit(train.cylinders[cylinder]).reciprocating
  const series = lambda + lambda ** 3 / 4 + (15 * lambda ** 5) / 128
  return mass * train.throws[pin].radius * plan.speed ** 2 * series
}

/** Force along the rod as two masses, pull positive. */
export function rodPull(engine: Engine): Draft {
  const { train, instant, cylinder } = engine
  const { reciprocating } = massSplit(train.cylinders[cylinder])
  return {
    title: 'Pull along the rod',
    quantity: 'force',
    unit: 'N',
    formula: '−(gas force + mass × acceleration) / cos(rod angle)',
    symbols: [
      gas(engine),
      symbol('mass', 'piston with all that goes to and fro', reciprocating, 'kg'),
      pistonAcceleration(engine),
      symbol('rod angle', 'angle of the rod', (instant.rodAngle[cylinder] * 180) / Math.PI, '°'),
    ],
    assumptions: ['Below 0 the rod is pushed.', twoMass, steady, massless],
    source: handbook,
  }
}
