import { DEGREES } from '../analysis/recorder'
import { indexOf, type Engine } from './engine'
import { symbol, type Draft } from './explanation'
import { size } from './sizes'
import { exact } from './words'

const MM = 1000
const cold = 'Cold and rigid: no play, no piston tilt, no growth by heat or speed.'
const rule = 'Plane geometry; the limit is common practice.'

/** Least at bottom dead centre, with the counterweight as the circle that its radius sweeps. */
export function skirtToCounterweight(engine: Engine): Draft {
  const { plan, train, cylinder } = engine
  const { bottomHeight, bottom } = plan.centres[cylinder]
  return {
    title: `Skirt of piston ${train.cylinders[cylinder].id} to the counterweight, at ${(bottom * DEGREES).toFixed(1)}°`,
    quantity: 'length',
    unit: 'mm',
    formula: 'lowest − skirt − radius',
    symbols: [
      symbol('lowest', 'piston pin over the crank axis at bottom dead centre', bottomHeight * MM, 'mm'),
      symbol(
        'skirt',
        'skirt below the piston pin',
        size(engine, 'skirtBelowPin', 'skirt below the pin') * MM,
        'mm',
      ),
      symbol(
        'radius',
        'that the counterweight sweeps',
        size(engine, 'counterweightRadius', 'counterweight radius') * MM,
        'mm',
      ),
    ],
    assumptions: ['At least 1.5 mm, cold.', cold, exact],
    source: rule,
  }
}

export function pistonToDeck(engine: Engine): Draft {
  const { plan, train, cylinder } = engine
  return {
    title: `Crown of piston ${train.cylinders[cylinder].id} to the deck, at top dead centre`,
    quantity: 'length',
    unit: 'mm',
    formula: 'deck − crown − highest',
    symbols: [
      symbol(
        'deck',
        'height of the deck over the crank axis',
        size(engine, 'deckHeight', 'deck height') * MM,
        'mm',
      ),
      symbol(
        'crown',
        'crown above the piston pin',
        size(engine, 'crownAbovePin', 'crown above the pin') * MM,
        'mm',
      ),
      symbol('highest', 'piston pin over the crank axis', plan.centres[cylinder].topHeight * MM, 'mm'),
    ],
    assumptions: ['A crown no higher than the deck.', cold, exact],
    source: rule,
  }
}

export function boreWall({ train, asked, cylinder }: Engine): Draft {
  const one = train.cylinders[cylinder]
  const beside = train.cylinders.findIndex((each, i) => i !== cylinder && each.bank === one.bank)
  const index = asked.other === undefined ? beside : indexOf(train.cylinders, asked.other, 'cylinder')
  if (index < 0) throw new RangeError('No other cylinder stands in this bank.')
  const other = train.cylinders[index]
  return {
    title: `Wall between the bores of ${one.id} and ${other.id}`,
    quantity: 'length',
    unit: 'mm',
    formula: 'apart − (bore + next bore) / 2',
    symbols: [
      symbol(
        'apart',
        'distance of the bores’ axes along the crank',
        Math.abs(one.axial - other.axial) * MM,
        'mm',
      ),
      symbol('bore', `of cylinder ${one.id}`, one.bore * MM, 'mm'),
      symbol('next bore', `of cylinder ${other.id}`, other.bore * MM, 'mm'),
    ],
    assumptions: ['At least 4 mm of wall, cold.', 'Without liners and water between them.'],
    source: rule,
  }
}
