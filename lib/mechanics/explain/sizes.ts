import { symbol, type Draft } from './explanation'
import { densities } from '../balance/half-disc'
import type { Engine } from './engine'
import { geometry, handbook } from './words'

const MM = 1000

const travel = ({ plan }: Engine, index: number) =>
  (plan.centres[index].topHeight - plan.centres[index].bottomHeight) * MM

/** pi / 4 × bore² × true stroke, in mm, of every cylinder. */
export function displacement(engine: Engine): Draft {
  const { train } = engine
  const sizes = train.cylinders.map(({ bore }, index) => ({ bore: bore * MM, stroke: travel(engine, index) }))
  const [first] = sizes
  const alike = sizes.every(
    ({ bore, stroke }) => bore === first.bore && Math.abs(stroke - first.stroke) < 1e-9 * first.stroke,
  )
  const swept = ({ bore, stroke }: typeof first) => ((Math.PI / 4) * bore ** 2 * stroke) / 1000
  return {
    title: 'Swept volume',
    quantity: 'volume',
    unit: 'cm³',
    formula: alike
      ? 'pi / 4 × bore² × true stroke × cylinders / 1000'
      : sizes.map((_, index) => `swept ${index + 1}`).join(' + '),
    symbols: alike
      ? [
          symbol('bore', 'bore', first.bore, 'mm'),
          symbol('true stroke', 'exact travel between dead centres', first.stroke, 'mm'),
          symbol('cylinders', 'number of cylinders', sizes.length),
        ]
      : sizes.map((size, index) =>
          symbol(
            `swept ${index + 1}`,
            `pi / 4 × bore² × true stroke / 1000 of cylinder ${train.cylinders[index].id}`,
            swept(size),
            'cm³',
          ),
        ),
    assumptions: [
      'The stroke is the true travel, which an offset makes a little longer than twice the throw.',
    ],
    source: geometry,
  }
}

/** Of the cylinder with the longest travel. */
export function meanPistonSpeed(engine: Engine): Draft {
  const strokes = engine.train.cylinders.map((_, index) => travel(engine, index))
  return {
    title: 'Mean piston speed',
    quantity: 'velocity',
    unit: 'm/s',
    formula: '2 × true stroke × speed / 60',
    symbols: [
      symbol('true stroke', 'exact travel between dead centres, the longest', Math.max(...strokes) / MM, 'm'),
      symbol('speed', 'engine speed', (engine.plan.speed * 30) / Math.PI, 'rpm'),
    ],
    assumptions: ['Two strokes a turn.'],
    source: handbook,
  }
}

export function compressionVolume(engine: Engine): Draft {
  const { train, cylinder } = engine
  const { bore, compressionRatio } = train.cylinders[cylinder]
  return {
    title: 'Volume at top dead centre',
    quantity: 'volume',
    unit: 'cm³',
    formula: 'pi / 4 × bore² × true stroke / (compression ratio − 1) / 1000',
    symbols: [
      symbol('bore', 'bore', bore * MM, 'mm'),
      symbol('true stroke', 'exact travel between dead centres', travel(engine, cylinder), 'mm'),
      symbol('compression ratio', 'volume at the bottom to volume at the top', compressionRatio),
    ],
    assumptions: ['The compression ratio is the geometric one.'],
    source: geometry,
  }
}

export function rodToStroke({ train, cylinder, pin }: Engine): Draft {
  return {
    title: 'Rod to stroke',
    quantity: 'ratio',
    unit: '',
    formula: 'rod / (2 × throw)',
    symbols: [
      symbol('rod', 'rod length between centres', train.cylinders[cylinder].rodLength * MM, 'mm'),
      symbol('throw', 'throw radius, half the stroke', train.throws[pin].radius * MM, 'mm'),
    ],
    assumptions: ['Nominal stroke: twice the throw radius.'],
    source: handbook,
  }
}

export function boreToStroke({ train, cylinder, pin }: Engine): Draft {
  return {
    title: 'Bore to stroke',
    quantity: 'ratio',
    unit: '',
    formula: 'bore / (2 × throw)',
    symbols: [
      symbol('bore', 'bore', train.cylinders[cylinder].bore * MM, 'mm'),
      symbol('throw', 'throw radius, half the stroke', train.throws[pin].radius * MM, 'mm'),
    ],
    assumptions: ['Nominal stroke: twice the throw radius.'],
    source: handbook,
  }
}

/** A size that the figure needs. Throws RangeError where it is not given. */
export function size(engine: Engine, key: keyof NonNullable<Engine['asked']['sizes']>, name: string): number {
  const value = engine.asked.sizes?.[key]
  if (value === undefined) throw new RangeError(`The ${name} is not given.`)
  return value
}

export function overlap(engine: Engine): Draft {
  const radius = engine.train.throws[engine.pin].radius
  return {
    title: 'Journal overlap',
    quantity: 'length',
    unit: 'mm',
    formula: '(pin + main) / 2 − throw',
    symbols: [
      symbol('pin', 'crank pin diameter', size(engine, 'pinDia', 'crank pin diameter') * MM, 'mm'),
      symbol('main', 'main journal diameter', size(engine, 'mainDia', 'main diameter') * MM, 'mm'),
      symbol('throw', 'throw radius, half the stroke', radius * MM, 'mm'),
    ],
    assumptions: ['Below 0 pin and main do not overlap: usual for a built-up crank, weak for one piece.'],
    source: handbook,
  }
}

/** Half disc of radius R and thickness t: centre of gravity at 4R/3π, so moment = 2/3·density·t·R³. */
export function counterweightCapacity(engine: Engine): Draft {
  const symbols = [
    symbol('density', 'density of the web, steel', densities.steel * 1e-6, 'g/mm³'),
    symbol('thickness', 'web thickness', size(engine, 'webThickness', 'web thickness') * MM, 'mm'),
    symbol(
      'radius',
      'counterweight radius',
      size(engine, 'counterweightRadius', 'counterweight radius') * MM,
      'mm',
    ),
  ]
  return {
    title: 'What a half disc can hold',
    quantity: 'unbalance',
    unit: 'g mm',
    formula: '2 / 3 × density × thickness × radius³',
    symbols,
    assumptions: [
      'The counterweight is a half disc of the web’s thickness; a real one loses its bolt holes and the pin’s side.',
    ],
    source: 'First moment of a half disc about its centre; steel at 7,850 kg/m³ is common practice.',
  }
}
