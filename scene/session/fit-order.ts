import { deadCentres } from '@/lib/mechanics/dead-centres'
import { rodPaths } from '@/lib/mechanics/rod-path'
import { wrap } from '@/lib/numerics/wrap'
import type { CrankTrain } from '@/scene/model/crank-train'
import { toTrain } from '@/scene/model/to-train'

/** Up to here every choice of turns is looked through; beyond, turns alternate. */
const SEARCHED = 14

/** Exact top dead centre of each cylinder in degrees, 0 … 360. */
export function topCentres(document: CrankTrain): { id: string; at: number }[] {
  const train = toTrain({ ...document, firingOrder: [] })
  return deadCentres(rodPaths(train)).map(({ top }, i) => ({
    id: train.cylinders[i].id,
    at: wrap(Number(((top * 180) / Math.PI).toFixed(6)), 360),
  }))
}

const spread = (angles: number[], cycle: number) => {
  const sorted = angles.toSorted((a, b) => a - b)
  return sorted.reduce((sum, angle, i) => {
    const next = i + 1 < sorted.length ? sorted[i + 1] : sorted[0] + cycle
    return sum + (next - angle) ** 2
  }, 0)
}

/** A firing order that the throws and banks allow, as even as can be found; it begins with the cylinder that led before. */
export function fitOrder(train: CrankTrain): string[] {
  const centres = topCentres(train)
  const cycle = train.cycle === 'two-stroke' ? 360 : 720
  const lead = train.firingOrder.find((id) => centres.some((centre) => centre.id === id)) ?? centres[0].id
  const turns = cycle === 360 ? centres.map(() => 0) : bestTurns(centres.map(({ at }) => at))
  const events = centres.map(({ id, at }, i) => ({ id, at: at + 360 * turns[i] })).sort((a, b) => a.at - b.at)
  const first = events.findIndex(({ id }) => id === lead)
  return [...events.slice(first), ...events.slice(0, first)].map(({ id }) => id)
}

function bestTurns(angles: number[]): number[] {
  if (angles.length > SEARCHED) {
    const rank = angles.map((_, i) => i).sort((a, b) => angles[a] - angles[b])
    const turns = angles.map(() => 0)
    rank.forEach((cylinder, i) => (turns[cylinder] = i % 2))
    return turns
  }
  let best: number[] = []
  let least = Infinity
  for (let choice = 0; choice < 2 ** (angles.length - 1); choice++) {
    const turns = angles.map((_, i) => (i === 0 ? 0 : (choice >> (i - 1)) & 1))
    const size = spread(
      angles.map((angle, i) => angle + 360 * turns[i]),
      720,
    )
    if (size < least - 1e-6) {
      least = size
      best = turns
    }
  }
  return best
}

/** Where one more cylinder fires: into the widest gap that one of its dead centres falls in. */
export function insertInOrder(train: CrankTrain, id: string, events: { id: string; at: number }[]): string[] {
  const own = topCentres(train).find((centre) => centre.id === id)!.at
  const cycle = train.cycle === 'two-stroke' ? 360 : 720
  const choices = cycle === 360 ? [own] : [own, own + 360]
  const gap = (at: number) =>
    Math.min(
      cycle,
      ...events.map((event) => Math.min(wrap(at - event.at, cycle), wrap(event.at - at, cycle))),
    )
  const at = choices.reduce((best, choice) => (gap(choice) > gap(best) + 1e-6 ? choice : best))
  return [...events, { id, at }].sort((a, b) => a.at - b.at).map((event) => event.id)
}
