import { densities, SLUG_AT } from '../balance/half-disc'
import { indexOf, type Engine } from './engine'
import { symbol, type Draft } from './explanation'
import { size } from './sizes'

const MM = 1000
/** kg/m³ to g/mm³. */
const PER_MM = 1e-6
const halfDisc =
  'The counterweight is a half disc of the web’s thickness; a real one loses its bolt holes and the pin’s side.'

function weightOf({ train, asked }: Engine) {
  const { counterweights } = train
  if (counterweights.length === 0) throw new RangeError('This crank has no counterweights.')
  return counterweights[indexOf(counterweights, asked.counterweight, 'counterweight')]
}

function room(engine: Engine) {
  return {
    density: symbol('density', 'density of the web, steel', densities.steel * PER_MM, 'g/mm³'),
    thickness: symbol('thickness', 'web thickness', size(engine, 'webThickness', 'web thickness') * MM, 'mm'),
    edge: symbol(
      'edge',
      'counterweight radius',
      size(engine, 'counterweightRadius', 'counterweight radius') * MM,
      'mm',
    ),
  }
}

/** Moment of a counterweight over that of the half disc which its web can be. */
export function counterweightShare(engine: Engine): Draft {
  const { id, mass, radius } = weightOf(engine)
  const { density, thickness, edge } = room(engine)
  return {
    title: `Share of what web ${id} holds`,
    quantity: 'share',
    unit: '%',
    formula: '100 × mass × radius / (2 / 3 × density × thickness × edge³)',
    symbols: [
      symbol('mass', 'of the counterweight', mass * MM, 'g'),
      symbol('radius', 'of its centre of gravity', radius * MM, 'mm'),
      density,
      thickness,
      edge,
    ],
    assumptions: [halfDisc],
    source: 'First moment of a half disc about its centre; steel at 7,850 kg/m³ is common practice.',
  }
}

/** What the half disc lacks, g mm, and the slug that closes it; nothing where the web holds it all. */
function slug(engine: Engine) {
  const { id, mass, radius } = weightOf(engine)
  const { density, thickness, edge } = room(engine)
  const holds = (2 / 3) * density.value * thickness.value * edge.value ** 3
  const lacking = Math.max(0, mass * radius * MM * MM - holds)
  const heavy = (engine.asked.slugDensity ?? densities['tungsten alloy']) * PER_MM
  const at = symbol('place', 'of the slug’s centre from the crank’s axis', SLUG_AT * edge.value, 'mm')
  return {
    id,
    lacking: symbol(
      'lacking',
      'counterweight’s mass × radius beyond what the half disc holds',
      lacking,
      'g mm',
    ),
    heavy: symbol('heavy', 'density of the slug', heavy, 'g/mm³'),
    density,
    at,
    thickness,
    assumptions: [
      `The slug fills its hole and lies at ${SLUG_AT * 100} % of the web’s radius (common practice).`,
      halfDisc,
    ],
  }
}

const displaced =
  'First moments about the crank’s axis: the slug adds what it weighs more than what it displaces.'

export function slugVolume(engine: Engine): Draft {
  const { id, lacking, heavy, density, at, assumptions } = slug(engine)
  return {
    title: `Slug in web ${id}, volume`,
    quantity: 'volume',
    unit: 'cm³',
    formula: 'lacking / ((heavy − density) × place) / 1000',
    symbols: [lacking, heavy, density, at],
    assumptions,
    source: displaced,
  }
}

export function slugMass(engine: Engine): Draft {
  const { id, lacking, heavy, density, at, assumptions } = slug(engine)
  return {
    title: `Slug in web ${id}, mass`,
    quantity: 'mass',
    unit: 'g',
    formula: 'heavy × lacking / ((heavy − density) × place)',
    symbols: [lacking, heavy, density, at],
    assumptions,
    source: displaced,
  }
}

/** Of a round slug right through the web. */
export function slugDiameter(engine: Engine): Draft {
  const { id, lacking, heavy, density, at, thickness, assumptions } = slug(engine)
  return {
    title: `Slug in web ${id}, diameter`,
    quantity: 'length',
    unit: 'mm',
    formula: 'root(4 × lacking / ((heavy − density) × place) / (pi × thickness))',
    symbols: [lacking, heavy, density, at, thickness],
    assumptions,
    source: displaced,
  }
}
