import { addLathe, tubeProfile } from '../mesh/lathe'
import { crankPart } from '../rig-parts'
import type { Room } from '../room'
import { addMainBearing } from './fixed'

const STEPS = 32

/** A bearing's length to its journal's. */
const BEARING = 0.84

/** Main journals from web to web, and the fixed bearings they run in. */
export function addJournals({ parts, train, shape, layout }: Room) {
  layout.journals.forEach(({ from, to, main }, i) => {
    const name = main >= 0 ? train.mains[main].id : i === 0 ? 'free' : 'drive'
    const label = main >= 0 ? `Main journal ${name}` : i === 0 ? 'Free-end stub' : 'Drive-end stub'
    const mesh = bar(parts, { radius: shape.mainRadius, bore: shape.mainBore }, 0, from, to)
    parts.add({ ...crankPart, id: `main-journal:${name}`, kind: 'main-journal', label }, mesh)
    if (main < 0) return
    const half = (BEARING / 2) * Math.min(shape.mainLength, to - from)
    const axial = Math.min(Math.max(train.mains[main].axial, from + half), to - half)
    const bearing = parts.mesh(`bearing ${half}`, axial, (builder) =>
      addMainBearing(builder, shape.mainRadius, -half, half),
    )
    parts.add(
      {
        id: `main-bearing:${name}`,
        kind: 'main-bearing',
        group: 'bores',
        body: parts.newBody(),
        motion: { kind: 'fixed' },
        label: `Main bearing ${name}`,
      },
      bearing,
    )
  })
}

/** Crank pins from web to web. Part index of each throw's. */
export function addPins({ parts, train, shape, layout }: Room): number[] {
  const pins: number[] = []
  for (const { from, to, throw: index } of layout.pins) {
    const { id, radius, angle } = train.throws[index]
    pins[index] = parts.add(
      { ...crankPart, id: `crank-pin:${id}`, kind: 'crank-pin', throw: index, label: `Crank pin ${id}` },
      bar(parts, { radius: shape.pinRadius, bore: shape.pinBore }, radius, from, to),
      { phase: angle },
    )
  }
  return pins
}

interface Round {
  radius: number
  bore: number
}

/** A round bar along the crank, bored through or solid, `offset` from the axis along its throw. */
function bar(
  parts: Room['parts'],
  { radius, bore }: Round,
  offset: number,
  from: number,
  to: number,
): number {
  const half = (to - from) / 2
  return parts.mesh(`bar ${radius} ${bore} ${offset} ${half}`, (from + to) / 2, (builder) =>
    addLathe(builder, {
      profile: tubeProfile(bore, radius, -half, half),
      axis: 'z',
      at: [0, offset],
      steps: STEPS,
      specAt: () => ({ fill: 'metal' }),
    }),
  )
}
