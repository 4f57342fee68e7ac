import { firingAngles, firingEvents, firingOf } from '@/lib/mechanics/firing'
import { legalFiringOrders } from '@/lib/mechanics/firing-orders'
import type { Train } from '@/lib/mechanics/train'
import type { CrankTrain } from '../crank-train'
import { toTrain } from '../to-train'
import type { Doubt } from './doubt'

const TURN = 2 * Math.PI
const degrees = (angle: number) => `${Math.round((angle * 180) / Math.PI)}°`
const joined = (order: readonly string[]) => order.join('-')

const isEven = (train: Train) => {
  try {
    return firingOf(train, firingEvents(train, firingAngles(train))).even
  } catch (error) {
    if (error instanceof RangeError) return false
    throw error
  }
}

/** Orders that fit and are probably not meant, and layouts that cannot fire evenly. */
export function firingDoubts(document: CrankTrain): Doubt[] {
  const train = toTrain(document)
  const { intervals, even } = firingOf(train, firingEvents(train))
  return even ? [] : [...bunched(document, train, intervals), ...evenRadial(document, train)]
}

/** All within one turn, and then a pause of more than one: the order is that of the other sense, or of the crank itself. */
function bunched(document: CrankTrain, train: Train, intervals: number[]): Doubt[] {
  const pause = Math.max(...intervals)
  if (document.cylinders.length < 3 || pause <= TURN + 0.01) return []
  const order = joined(document.firingOrder)
  const [fits] = legalFiringOrders(ideal(train), { even: true })
  const usual =
    fits &&
    rotated(
      fits.map((index) => train.cylinders[index].id),
      document.firingOrder[0],
    )
  const mirrored = document.throws.map(({ angleDeg }) => (360 - angleDeg) % 360)
  const throws = train.throws.map((pin) => ({ ...pin, angle: -pin.angle }))
  const wrongSense = isEven(ideal({ ...train, throws }))
  const said = `${order} fits these throws only with all firing within ${degrees(train.cycle - pause)} and then a pause of ${degrees(pause)}.`
  const instead = usual ? ` The even order is ${joined(usual)}.` : ''
  return [
    {
      code: wrongSense ? 'F04' : 'F05',
      path: 'firingOrder',
      value: (pause * 180) / Math.PI,
      head: 'The firing is bunched.',
      message: `${said}${instead}${wrongSense ? ` ${order} fires evenly with throws at ${mirrored.join('/')}.` : ''}`,
      ...(usual && {
        mend: { label: `Use order ${joined(usual)}`, changes: [{ path: ['firingOrder'], value: usual }] },
      }),
    },
  ]
}

/** Every rod on the pin itself and its cylinder through the crank's axis: what knuckles and offsets shift is left out. */
const ideal = (train: Train): Train => ({
  ...train,
  cylinders: train.cylinders.map((cylinder) => ({
    ...cylinder,
    offset: 0,
    link: undefined,
    rodLength: train.cylinders[cylinder.link?.master ?? train.cylinders.indexOf(cylinder)].rodLength,
  })),
})

function rotated(order: string[], lead: string): string[] {
  const first = Math.max(0, order.indexOf(lead))
  return [...order.slice(first), ...order.slice(0, first)]
}

/** One row on one throw fires evenly on a four-stroke only with an odd count. */
function evenRadial(document: CrankTrain, train: Train): Doubt[] {
  const count = document.cylinders.length
  const row = document.throws.length === 1 && count >= 4 && count % 2 === 0
  const round = document.banks.length === count
  if (!row || !round || document.cycle !== 'four-stroke') return []
  const intervals = firingOf(train, firingEvents(train)).intervals.map(degrees)
  return [
    {
      code: 'F09',
      path: 'cylinders',
      value: count,
      head: `${count} cylinders in one row.`,
      message: `A four-stroke row with ${count} cylinders cannot fire evenly: use an odd count, or accept ${[...new Set(intervals)].join(' and ')}.`,
    },
  ]
}
