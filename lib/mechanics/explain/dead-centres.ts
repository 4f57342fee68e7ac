import { DEGREES } from '../analysis/recorder'
import type { Engine } from './engine'
import { symbol, type Draft } from './explanation'
import { motion, rodOf } from './motion'
import { exact, geometry } from './words'

const MM = 1000

export function trueStroke(engine: Engine): Draft {
  const { linked, radius, rod, offset } = rodOf(engine)
  const { topHeight, bottomHeight } = engine.plan.centres[engine.cylinder]
  return {
    title: 'True stroke',
    quantity: 'length',
    unit: 'mm',
    formula: linked ? 'highest − lowest' : 'root((rod + throw)² − offset²) − root((rod − throw)² − offset²)',
    symbols: linked
      ? [
          symbol('highest', 'greatest height of the piston pin', topHeight * MM, 'mm'),
          symbol('lowest', 'least height of the piston pin', bottomHeight * MM, 'mm'),
        ]
      : [rod, radius, offset],
    ...motion(engine),
  }
}

/** Crank angle at a dead centre, where crank and rod are in line; a link's where its height is greatest or least. */
function deadCentre(engine: Engine, top: boolean): Draft {
  const { path, linked, radius, rod, offset } = rodOf(engine)
  const { plan, train, cylinder, pin } = engine
  const at = (top ? plan.centres[cylinder].top : plan.centres[cylinder].bottom) * DEGREES
  const own = top
    ? Math.asin(path.offset / (path.length + path.radius))
    : Math.PI + Math.asin(path.offset / (path.length - path.radius))
  const bank = train.banks[train.cylinders[cylinder].bank].angle * DEGREES
  const stand = train.throws[pin].angle * DEGREES
  const turns = Math.round((at - (own * DEGREES + bank - stand)) / 360)
  const title = top ? 'Top dead centre' : 'Bottom dead centre'
  if (linked)
    return {
      title,
      quantity: 'angle',
      unit: '°',
      formula: 'place',
      symbols: [
        symbol(
          'place',
          `crank angle where the piston pin stands ${top ? 'highest' : 'lowest'}, searched`,
          at,
          '°',
        ),
      ],
      assumptions: ['A link rod has no formula for it: it is where the piston’s velocity is 0.', exact],
      source: geometry,
    }
  return {
    title,
    quantity: 'angle',
    unit: '°',
    formula: `${top ? 'asin(offset / (rod + throw))' : '180 + asin(offset / (rod − throw))'} + bank − stand + 360 × turns`,
    symbols: [
      offset,
      rod,
      radius,
      symbol('bank', 'angle of the bank', bank, '°'),
      symbol('stand', 'angle of the throw', stand, '°'),
      symbol('turns', 'whole turns that bring it into 0 to 360°', turns),
    ],
    ...motion(engine),
  }
}

export const topDeadCentre = (engine: Engine) => deadCentre(engine, true)
export const bottomDeadCentre = (engine: Engine) => deadCentre(engine, false)
