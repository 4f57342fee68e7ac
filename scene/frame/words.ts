import type { Instant } from '@/lib/mechanics/instant'
import type { Train } from '@/lib/mechanics/train'
import { quantityText } from '@/lib/units/format'
import type { System } from '@/lib/units/quantities'
import { buildFiringMarkers, fillFiringMarkers, burnOf, type FiringEvent } from './firing-markers'

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
  const next = upcoming(markers.since, events, train.cycle)
  return [
    crank,
    ...burning.map((i) => firingSentence(train, instant, i, system)),
    nextSentence(train, next, system),
  ].join(' ')
}

function firingSentence(train: Train, instant: Instant, index: number, system: System): string {
  const { id } = train.cylinders[index]
  if (train.gas.model === 'none') return `Cylinder ${id} is firing.`
  return `Cylinder ${id} is firing, ${quantityText(instant.gasForce[index], 'force', system)} on its piston.`
}

function upcoming(since: Float64Array, events: readonly FiringEvent[], cycle: number) {
  return events
    .map(({ cylinder }) => ({ cylinder, wait: cycle - since[cylinder] }))
    .reduce((soonest, event) => (event.wait < soonest.wait ? event : soonest))
}

function nextSentence(train: Train, next: { cylinder: number; wait: number }, system: System): string {
  return `Cylinder ${train.cylinders[next.cylinder].id} fires next, in ${quantityText(next.wait, 'angle', system)}.`
}
