import { wrap } from '@/lib/numerics/wrap'
import type { CrankTrain } from '@/scene/model/crank-train'
import type { Mend } from './field'
import { topCentres } from './fit-order'

/** Something else than names typed as a firing order: intervals, or names by bank; null where it is an order. */
export function orderSlip(order: string[], train: CrankTrain): { message: string; mends: Mend[] } | null {
  const known = new Set(train.cylinders.map(({ id }) => id))
  if (order.length === 0 || order.some((name) => known.has(name))) return null
  return byBank(order, train) ?? byIntervals(order, train)
}

/** 1L-4R: numbered along each bank from the free end, R the bank on the right seen from the flywheel (SAE J824, method B). */
function byBank(order: string[], train: CrankTrain) {
  const read = order.map((name) => /^(?:(\d+)\s*([LR])|([LR])\s*(\d+))$/i.exec(name))
  if (train.banks.length !== 2 || read.some((each) => !each)) return null
  const toRight = train.rotation === 'clockwise' ? -1 : 1
  const [right, left] = train.banks.toSorted((one, other) => toRight * (other.angleDeg - one.angleDeg))
  const along = (bank: string) =>
    train.cylinders
      .filter((cylinder) => cylinder.bank === bank)
      .toSorted((one, other) => one.axialMm - other.axialMm)
  const names = read.map((each) => {
    const bank = (each![2] ?? each![3]).toUpperCase() === 'R' ? right : left
    return along(bank.id)[Number(each![1] ?? each![4]) - 1]?.id
  })
  if (names.some((name) => name === undefined)) return null
  const text = names.join('-')
  return {
    message: `The order uses L and R labels, and the cylinders are called ${train.cylinders.map(({ id }) => id).join(', ')}. Counted along each bank from the free end, L and R as seen from the flywheel (SAE J824, method B), it is ${text}.`,
    mends: [{ label: `Use ${text}`, text }],
  }
}

/** 90-90-90…: the angles between firings. They must close the cycle, and then they say the order. */
function byIntervals(order: string[], train: CrankTrain) {
  const intervals = order.map(Number)
  const cycle = train.cycle === 'two-stroke' ? 360 : 720
  if (order.length !== train.cylinders.length || intervals.some((value) => !(value > train.cylinders.length)))
    return null
  const sum = intervals.reduce((total, value) => total + value, 0)
  if (Math.abs(sum - cycle) > 0.5) {
    const last = intervals.at(-1)! + cycle - sum
    const text = [...order.slice(0, -1), Number(last.toFixed(2))].join('-')
    return {
      message: `Read as intervals, they add up to ${Number(sum.toFixed(2))}°, and must be ${cycle}°.`,
      mends: last > 0 ? [{ label: `Use ${text}`, text }] : [],
    }
  }
  const found = ordered(intervals, train, cycle)
  return {
    message: `Read as intervals of ${cycle}° in all. ${found ? `With this crank they are the order ${found.join('-')}.` : 'No order of this crank has them.'}`,
    mends: found ? [{ label: `Use order ${found.join('-')}`, text: found.join('-') }] : [],
  }
}

function ordered(intervals: number[], train: CrankTrain, cycle: number): string[] | null {
  const place = (id: string) => train.firingOrder.indexOf(id)
  // of several orders with these intervals, the one that stands
  const tops = topCentres(train).toSorted((one, other) => place(one.id) - place(other.id))
  const lead = tops.find(({ id }) => id === train.firingOrder[0]) ?? tops[0]
  const search = (order: string[], at: number): string[] | null => {
    if (order.length === tops.length) return order
    const next = at + intervals[order.length - 1]
    for (const { id, at: top } of tops) {
      const off = wrap(next - top + 0.5, 360)
      const found = !order.includes(id) && off <= 1 ? search([...order, id], wrap(next, cycle)) : null
      if (found) return found
    }
    return null
  }
  return search([lead.id], lead.at)
}
