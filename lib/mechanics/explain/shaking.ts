import { fourierCoefficient, unitCircle } from '@/lib/numerics/fourier'
import { textbookOrders } from '../balance/textbook-orders'
import { buildInstant, buildPlan, fillInstant } from '../plan'
import type { Train } from '../train'
import type { Engine } from './engine'
import { symbol, type Draft } from './explanation'
import { evaluate } from './formula'
import { newton, sampledEachDegree, steady } from './words'

/** The shaking of one part of the train alone, at the asked angle. */
function shakingOf(engine: Engine, part: Partial<Train>) {
  const plan = buildPlan({ ...engine.train, ...part }, engine.plan.speed)
  const instant = buildInstant(plan)
  fillInstant(instant, plan, engine.instant.angle)
  return instant
}

function partsOf(engine: Engine) {
  const { train } = engine
  const throws = train.throws.map((pin) => ({ ...pin, unbalance: 0 }))
  const rods = shakingOf(engine, { throws, counterweights: [], balanceShafts: [] })
  const turning = shakingOf(engine, { balanceShafts: [] })
  return { rods, turning }
}

const dAlembert = `${newton} What acts on the frame is mass × acceleration, reversed.`

export function shakingForce(engine: Engine): Draft {
  const { rods, turning } = partsOf(engine)
  const all = engine.instant
  const of = (word: string, name: string, value: number) => symbol(word, name, value, 'N')
  return {
    title: 'Shaking force at this angle',
    quantity: 'force',
    unit: 'N',
    formula: 'root((rods up + crank up + shafts up)² + (rods aside + crank aside + shafts aside)²)',
    symbols: [
      of('rods up', 'inertia of pistons and rods, vertical', rods.shakingVertical),
      of('crank up', 'throws and counterweights, vertical', turning.shakingVertical - rods.shakingVertical),
      of('shafts up', 'balance shafts, vertical', all.shakingVertical - turning.shakingVertical),
      of('rods aside', 'inertia of pistons and rods, horizontal', rods.shakingHorizontal),
      of(
        'crank aside',
        'throws and counterweights, horizontal',
        turning.shakingHorizontal - rods.shakingHorizontal,
      ),
      of('shafts aside', 'balance shafts, horizontal', all.shakingHorizontal - turning.shakingHorizontal),
    ],
    assumptions: ['By inertia alone, on the engine’s frame.', steady],
    source: dAlembert,
  }
}

export function shakingCouple(engine: Engine): Draft {
  const { rods, turning } = partsOf(engine)
  const all = engine.instant
  const of = (word: string, name: string, value: number) => symbol(word, name, value, 'N m')
  return {
    title: 'Shaking couple at this angle',
    quantity: 'torque',
    unit: 'N m',
    formula: 'root((rods up + crank up + shafts up)² + (rods aside + crank aside + shafts aside)²)',
    symbols: [
      of('rods up', 'place × inertia of pistons and rods, vertical', rods.coupleVertical),
      of(
        'crank up',
        'place × throws and counterweights, vertical',
        turning.coupleVertical - rods.coupleVertical,
      ),
      of('shafts up', 'place × balance shafts, vertical', all.coupleVertical - turning.coupleVertical),
      of('rods aside', 'place × inertia of pistons and rods, horizontal', rods.coupleHorizontal),
      of(
        'crank aside',
        'place × throws and counterweights, horizontal',
        turning.coupleHorizontal - rods.coupleHorizontal,
      ),
      of(
        'shafts aside',
        'place × balance shafts, horizontal',
        all.coupleHorizontal - turning.coupleHorizontal,
      ),
    ],
    assumptions: ['Places are counted from the reference place of the couples.', steady],
    source: dAlembert,
  }
}

type Sense = 'forward' | 'backward'

/** |c| of vertical + i·horizontal at ±order, from its cosine and sine means. */
function phasor(engine: Engine, sense: Sense, kind: 'force' | 'couple'): Draft {
  const order = engine.asked.order ?? 1
  const turns = Math.round(engine.train.cycle / (2 * Math.PI))
  const bin = order * turns
  if (!(Number.isInteger(bin) && bin >= 1 && order <= 12))
    throw new RangeError(`There is no order ${order} in this cycle: orders run from ${1 / turns} to 12.`)
  const cycle = engine.cycle()
  const [v, h] =
    kind === 'force' ? [cycle.vertical, cycle.horizontal] : [cycle.coupleVertical, cycle.coupleHorizontal]
  const circle = unitCircle(v.length)
  const [up, aside] = [fourierCoefficient(v, bin, circle), fourierCoefficient(h, bin, circle)]
  const unit = kind === 'force' ? 'N' : 'N m'
  const of = (word: string, name: string, value: number) => symbol(word, name, value, unit)
  const [plus, minus] = sense === 'forward' ? ['+', '−'] : ['−', '+']
  return {
    title: `Order ${order}, ${kind} turning ${sense}${engine.asked.bare ? ', bare crank' : ''}`,
    quantity: kind === 'force' ? 'force' : 'torque',
    unit,
    formula: `root((up cosine ${plus} aside sine)² + (aside cosine ${minus} up sine)²)`,
    symbols: [
      of('up cosine', `mean of vertical × cos(${order} × crank angle)`, up.re),
      of('up sine', `mean of vertical × sin(${order} × crank angle)`, -up.im),
      of('aside cosine', `mean of horizontal × cos(${order} × crank angle)`, aside.re),
      of('aside sine', `mean of horizontal × sin(${order} × crank angle)`, -aside.im),
    ],
    assumptions: [
      `${sense === 'forward' ? 'Turns with the crank: counterweights reach the first order of it.' : 'Turns against the crank: only a shaft that turns so reaches it.'}`,
      sampledEachDegree,
      steady,
    ],
    source:
      'Fourier coefficients of the exact signal; forward and backward as by the direct and reverse crank method of handbooks (common practice).',
    ...(order === 2 && { beside: textbookSecond(engine, sense, kind) }),
  }
}

function textbookSecond({ train, plan }: Engine, sense: Sense, kind: 'force' | 'couple'): Draft['beside'] {
  const second = textbookOrders(train).find(({ order }) => order === 2)
  if (!second) return undefined
  return {
    name: 'By the textbook’s first term',
    value: second[kind][sense].size * plan.speed ** 2,
    unit: kind === 'force' ? 'N' : 'N m',
  }
}

export const orderForward = (engine: Engine) => phasor(engine, 'forward', 'force')
export const orderBackward = (engine: Engine) => phasor(engine, 'backward', 'force')
export const orderCoupleForward = (engine: Engine) => phasor(engine, 'forward', 'couple')
export const orderCoupleBackward = (engine: Engine) => phasor(engine, 'backward', 'couple')

/** Half axes of the ellipse that an order draws: forward and backward add up, and pull apart. */
function axis(engine: Engine, kind: 'force' | 'couple', which: 'long' | 'short'): Draft {
  const { quantity, unit, assumptions, source, title } = phasor(engine, 'forward', kind)
  const of = (sense: Sense) => {
    const { formula, symbols } = phasor(engine, sense, kind)
    return evaluate(formula, Object.fromEntries(symbols.map(({ symbol: word, value }) => [word, value])))
  }
  return {
    title: title.replace('turning forward', `${which} axis`),
    quantity,
    unit,
    formula: which === 'long' ? 'forward + backward' : 'root((forward − backward)²)',
    symbols: [
      symbol('forward', 'what turns with the crank', of('forward'), unit),
      symbol('backward', 'what turns against the crank', of('backward'), unit),
    ],
    assumptions: [
      'Together they draw an ellipse: its half axes are their sum and their difference.',
      ...assumptions.slice(1),
    ],
    source,
  }
}

export const orderLongAxis = (engine: Engine) => axis(engine, 'force', 'long')
export const orderShortAxis = (engine: Engine) => axis(engine, 'force', 'short')
export const orderCoupleLongAxis = (engine: Engine) => axis(engine, 'couple', 'long')
export const orderCoupleShortAxis = (engine: Engine) => axis(engine, 'couple', 'short')
