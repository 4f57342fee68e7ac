import { DEGREES } from '../analysis/recorder'
import type { Engine } from './engine'
import { symbol, type Draft, type SymbolValue } from './explanation'
import { degreesInside, exact, geometry, steady } from './words'

const MM = 1000

/** The rod of the asked cylinder, in mm and degrees. */
export function rodOf({ plan, cylinder }: Engine) {
  const path = plan.paths[cylinder]
  return {
    path,
    linked: path.master >= 0,
    radius: symbol('throw', 'throw radius, half the stroke', path.radius * MM, 'mm'),
    rod: symbol('rod', 'rod length between centres', path.length * MM, 'mm'),
    offset: symbol('offset', 'offset of the cylinder axis', path.offset * MM, 'mm'),
  }
}

/** Where the crank pin stands, from the cylinder axis. */
const angle = ({ plan, instant, cylinder }: Engine) =>
  symbol(
    'angle',
    'crank angle from the cylinder axis',
    (((instant.angle + plan.paths[cylinder].phase) * DEGREES) % 360) + 0,
    '°',
  )

/** A link rod's big end rides on its master rod: its place and motion are worked out first. Per radian. */
function bigEnd({ instant, cylinder }: Engine) {
  const { motion } = instant
  const at = (word: string, name: string, value: number) => symbol(word, name, value * MM, 'mm')
  return {
    up: at('big end up', 'height of the link rod’s big end on its master', motion.bigEndU[cylinder]),
    aside: at('big end aside', 'the same, beside the crank axis', motion.bigEndV[cylinder]),
    up1: at('big end up by angle', 'its change for a radian of the crank', motion.bigEndU1[cylinder]),
    aside1: at('big end aside by angle', 'the same, aside', motion.bigEndV1[cylinder]),
    up2: at('second change up', 'its second change for a radian of the crank', motion.bigEndU2[cylinder]),
    aside2: at('second change aside', 'the same, aside', motion.bigEndV2[cylinder]),
  }
}

/** Height of the piston pin: s = r cos a + √(l² − (r sin a − e)²), or from a link's big end. */
function height(engine: Engine): { formula: string; symbols: SymbolValue[] } {
  const { linked, radius, rod, offset } = rodOf(engine)
  if (!linked)
    return {
      formula: 'throw × cos(angle) + root(rod² − (throw × sin(angle) − offset)²)',
      symbols: [radius, rod, offset, angle(engine)],
    }
  const { up, aside } = bigEnd(engine)
  return { formula: 'big end up + root(rod² − (big end aside − offset)²)', symbols: [up, aside, rod, offset] }
}

export const motion = (engine: Engine) => ({
  assumptions: [
    exact,
    ...(rodOf(engine).linked ? ['A link rod: its big end is on the master rod.'] : []),
    degreesInside,
  ],
  source: geometry,
})

export function pinHeight(engine: Engine): Draft {
  return {
    title: 'Height of the piston pin',
    quantity: 'length',
    unit: 'mm',
    ...height(engine),
    ...motion(engine),
  }
}

export function travel(engine: Engine): Draft {
  const { formula, symbols } = height(engine)
  const top = engine.plan.centres[engine.cylinder].topHeight * MM
  return {
    title: 'Piston travel from top dead centre',
    quantity: 'length',
    unit: 'mm',
    formula: `top height − (${formula})`,
    symbols: [
      symbol('top height', 'height of the piston pin at exact top dead centre', top, 'mm'),
      ...symbols,
    ],
    ...motion(engine),
  }
}

const lean = ({ instant, cylinder }: Engine) =>
  symbol('rod angle', 'angle of the rod from the cylinder axis', instant.rodAngle[cylinder] * DEGREES, '°')
const speed = ({ plan }: Engine) => symbol('speed', 'crank speed', plan.speed, 'rad/s')

export function velocity(engine: Engine): Draft {
  const { linked, radius } = rodOf(engine)
  const { up1, aside1 } = bigEnd(engine)
  return {
    title: 'Piston velocity',
    quantity: 'velocity',
    unit: 'm/s',
    formula: linked
      ? 'speed × (big end up by angle − big end aside by angle × tan(rod angle)) / 1000'
      : '−speed × throw × (sin(angle) + cos(angle) × tan(rod angle)) / 1000',
    symbols: linked
      ? [speed(engine), up1, aside1, lean(engine)]
      : [speed(engine), radius, angle(engine), lean(engine)],
    assumptions: ['Positive away from the crank.', steady, ...motion(engine).assumptions],
    source: geometry,
  }
}

export function acceleration(engine: Engine): Draft {
  const { linked, radius, rod } = rodOf(engine)
  const { aside1, up2, aside2 } = bigEnd(engine)
  return {
    title: 'Piston acceleration',
    quantity: 'acceleration',
    unit: 'm/s²',
    formula: linked
      ? 'speed² × (second change up − second change aside × tan(rod angle) − big end aside by angle² / (rod × cos(rod angle)³)) / 1000'
      : 'speed² × (throw × (sin(angle) × tan(rod angle) − cos(angle)) − throw² × cos(angle)² / (rod × cos(rod angle)³)) / 1000',
    symbols: linked
      ? [speed(engine), up2, aside2, aside1, rod, lean(engine)]
      : [speed(engine), radius, rod, angle(engine), lean(engine)],
    assumptions: ['Positive away from the crank.', steady, ...motion(engine).assumptions],
    source: geometry,
  }
}

export function rodAngle(engine: Engine): Draft {
  const { linked, radius, rod, offset } = rodOf(engine)
  const { aside } = bigEnd(engine)
  return {
    title: 'Rod angle',
    quantity: 'angle',
    unit: '°',
    formula: linked ? 'asin((big end aside − offset) / rod)' : 'asin((throw × sin(angle) − offset) / rod)',
    symbols: linked ? [aside, offset, rod] : [radius, angle(engine), offset, rod],
    ...motion(engine),
  }
}
