import type { Instant } from '@/lib/mechanics/instant'
import type { Train } from '@/lib/mechanics/train'
import { quantityText } from '@/lib/units/format'
import type { System } from '@/lib/units/quantities'
import {
  buildFiringMarkers,
  burnOf,
  fillFiringMarkers,
  type FiringEvent,
  type FiringMarkers,
} from './firing-markers'

/**
 * The text twin of what runs: "Crank 22.0°. Cylinder 1 is firing, 44.0 kN on its piston. Cylinder 8 fires next, in 68.0°."
 */
export function stateInWords(
  train: Train,
  instant: Instant,
  events: readonly FiringEvent[],
  system: System,
): string {
  const crank = `Crank ${quantityText(instant.angle, 'angle', system)}.`
  if (events.length === 0) return crank
  const markers = fillFiringMarkers(
    buildFiringMarkers(train.cylinders.length),
    events,
    train.cycle,
    burnOf(train.gas),
    instant.angle,
  )
  const burning = train.cylinders.flatMap((_, i) => (markers.burning[i] ? [i] : []))
  const next = upcoming(markers, events, train.cycle)
  return [
    crank,
    ...burning.map((i) => firingSentence(train, instant, i, system)),
    ...(next ? [nextSentence(train, next, system)] : []),
  ].join(' ')
}

function firingSentence(train: Train, instant: Instant, index: number, system: System): string {
  const { id } = train.cylinders[index]
  if (train.gas.model === 'none') return `Cylinder ${id} is firing.`
  return `Cylinder ${id} is firing, ${quantityText(instant.gasForce[index], 'force', system)} on its piston.`
}

/** Who fires next of those that do not burn: a charge lit before its top dead centre is firing, not yet to fire. */
function upcoming({ since, burning }: FiringMarkers, events: readonly FiringEvent[], cycle: number) {
  return events
    .filter(({ cylinder }) => burning[cylinder] === 0)
    .map(({ cylinder }) => ({ cylinder, wait: cycle - since[cylinder] }))
    .sort((one, other) => one.wait - other.wait)
    .at(0)
}

function nextSentence(train: Train, next: { cylinder: number; wait: number }, system: System): string {
  return `Cylinder ${train.cylinders[next.cylinder].id} fires next, in ${quantityText(next.wait, 'angle', system)}.`
}
