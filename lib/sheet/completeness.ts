import { formatNumber, quantityText } from '@/lib/units/format'
import { intervalsInWords, layoutInWords } from '@/scene/model/summary'
import type { Printed } from './sheet-tables'

export type Standing = 'present' | 'in part' | 'missing'

/** One thing that a class society asks for with a crankshaft, and what this document has of it. */
export interface Asked {
  item: string
  standing: Standing
  found: string
}

const present = (item: string, found: string): Asked => ({ item, standing: 'present', found })
const part = (item: string, found: string): Asked => ({ item, standing: 'in part', found })
const missing = (item: string, found: string): Asked => ({ item, standing: 'missing', found })

/**
 * The documents and inputs that class rules for crankshafts ask for, item by item (common practice of the unified
 * requirement on the calculation of crankshafts for internal combustion engines).
 */
export function completeness(printed: Printed): Asked[] {
  const { document, train, analysis } = printed
  const { cylinderDefaults: sizes, masses, gas, operating } = document
  const [one] = train.cylinders
  const fired = gas.model !== 'none'
  const { firing, torque, balance } = analysis
  const length = (metres: number) => quantityText(metres, 'length', 'si')
  const mass = (kilograms: number) => quantityText(kilograms, 'mass', 'si')
  const volume = analysis.train.displacementCc / 1e6
  const workPerCycle = torque.meanNm * train.cycle
  const pressures = Object.values(analysis.gas).flatMap(({ pressureBar }) => pressureBar)
  const bankAngles = train.banks.map(({ angle }) => (angle * 180) / Math.PI)
  const vee = bankAngles.length > 1 ? Math.abs(bankAngles[1] - bankAngles[0]) : null
  const nearest = document.cylinders.toSorted((a, b) => a.axialMm - b.axialMm)[0].id
  const weights = document.counterweights.length
  const webs = document.throws.filter(({ unbalanceKgMm }) => unbalanceKgMm !== 0).length
  return [
    present('Engine type', `${document.cycle}, ${layoutInWords(document).toLowerCase()}`),
    operating?.ratedRpm
      ? part(
          'Power and speed at maximum continuous rating',
          `${formatNumber(operating.ratedRpm, { decimals: 0 })} rpm; power is not part of the document`,
        )
      : missing('Power and speed at maximum continuous rating', 'no rated speed'),
    fired
      ? present('Maximum cylinder pressure', `${formatNumber(Math.max(...pressures), { decimals: 1 })} bar`)
      : missing('Maximum cylinder pressure', 'no gas model'),
    fired
      ? present(
          'Mean indicated pressure',
          `${formatNumber(workPerCycle / volume / 1e5, { decimals: 2 })} bar, from the closed cycle`,
        )
      : missing('Mean indicated pressure', 'no gas model'),
    gas.model === 'heat-release'
      ? present('Inlet pressure', `${formatNumber(gas.intakePressureBar, { decimals: 2 })} bar`)
      : missing('Inlet pressure', fired ? 'not stated beside a measured trace' : 'no gas model'),
    gas.model === 'trace'
      ? present('Gas pressure over crank angle, digitised', `${gas.angleDeg.length} points`)
      : gas.model === 'heat-release'
        ? part('Gas pressure over crank angle, digitised', 'calculated from heat release, not measured')
        : missing('Gas pressure over crank angle, digitised', 'no gas model'),
    sizes.compressionRatio === undefined
      ? missing('Compression ratio', 'not stated')
      : present('Compression ratio', formatNumber(sizes.compressionRatio, { decimals: 2 })),
    present(
      'Vee angle and firing interval',
      `${vee === null ? 'one bank' : `${formatNumber(vee, { decimals: 1 })}°`}; ${intervalsInWords(firing.intervalsDeg, firing.even)}`,
    ),
    present(
      'Firing order with numbering end',
      `${document.firingOrder.join('-')}; cylinder ${nearest} is nearest the free end`,
    ),
    present('Bore and stroke', `${length(one.bore)} × ${length(2 * train.throws[one.throw].radius)}`),
    one.bigEndBearing > 0
      ? present('Rod mass with bearings', mass(one.rod.mass + one.bigEndBearing))
      : part('Rod mass with bearings', `${mass(one.rod.mass)}; no big-end bearing`),
    present('Rod centre of gravity from the large end', length(one.rod.cgFromBigEnd)),
    one.rod.rigid
      ? present('Rod radius of gyration', length(Math.sqrt(one.rod.inertia / one.rod.mass)))
      : missing('Rod radius of gyration', 'no moment of inertia: the rod is two masses'),
    present('Rod length', length(one.rodLength)),
    webs > 0
      ? part(
          'Crank-web mass and its centre of gravity',
          `as mass × radius of ${webs} of ${document.throws.length} throws`,
        )
      : missing('Crank-web mass and its centre of gravity', 'throws have no unbalance of their own'),
    weights > 0
      ? present('Counterweights: mass, place, centre of gravity', `${weights} counterweights`)
      : part('Counterweights: mass, place, centre of gravity', 'none in the document'),
    masses.ringsKg > 0
      ? present('Piston mass with rings', mass(one.pistonMass))
      : part('Piston mass with rings', `${mass(one.pistonMass)}; rings have no entry of their own`),
    present(
      'Reciprocating masses of every throw',
      train.throws.map(({ id }) => mass(balance.bobWeights[id].reciprocatingKg)).join(', '),
    ),
  ]
}
