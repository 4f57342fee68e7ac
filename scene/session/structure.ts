import type { CrankTrain } from '@/scene/model/crank-train'
import { insertInOrder } from './fit-order'

/** Whole-train edits: each answers a new document in which every reference still holds. */

type Events = { id: string; at: number }[]

const freshId = (taken: string[], candidates: Iterable<string>) => {
  for (const id of candidates) if (!taken.includes(id)) return id
  return `${taken.length + 1}`
}
function* numbers(prefix = '') {
  for (let n = 1; n < 1000; n++) yield `${prefix}${n}`
}
function* letters() {
  for (let n = 0; n < 26; n++) yield String.fromCharCode(65 + n)
}
const ids = (list: { id: string }[]) => list.map(({ id }) => id)

/** The usual distance between neighbours along the crank, mm. */
const pitchOf = (places: number[], fallback: number) => {
  const sorted = [...new Set(places)].sort((a, b) => a - b)
  const gaps = sorted.slice(1).map((place, i) => place - sorted[i])
  return gaps.length > 0 ? Math.max(...gaps) : fallback
}
const bore = (train: CrankTrain) => train.cylinderDefaults.boreMm ?? train.cylinders[0].boreMm ?? 90

export function addBank(train: CrankTrain): CrankTrain {
  const id = freshId(ids(train.banks), letters())
  const last = train.banks.at(-1)!
  const step = train.banks.length > 1 ? last.angleDeg - train.banks.at(-2)!.angleDeg : 90
  return { ...train, banks: [...train.banks, { id, angleDeg: last.angleDeg + step }] }
}

/** One more throw at the drive end, with a main beyond it. */
export function addThrow(train: CrankTrain): CrankTrain {
  const places = train.throws.map((pin) => pin.axialMm)
  const pitch = pitchOf(places, 1.12 * bore(train))
  const last = train.throws.reduce((far, pin) => (pin.axialMm > far.axialMm ? pin : far))
  const axialMm = last.axialMm + pitch
  const end = Math.max(last.axialMm + pitch / 2, ...train.mains.map((main) => main.axialMm))
  return {
    ...train,
    throws: [...train.throws, { ...last, id: freshId(ids(train.throws), numbers()), axialMm }],
    mains: [...train.mains, { id: freshId(ids(train.mains), numbers('M')), axialMm: end + pitch }],
  }
}

/** One more cylinder, on the throw and bank with the fewest, firing where there is most room. */
export function addCylinder(train: CrankTrain, events: Events): CrankTrain {
  const id = freshId(ids(train.cylinders), numbers())
  const fewest = <T extends { id: string }>(list: T[], key: 'throw' | 'bank') => {
    const load = (item: T) => train.cylinders.filter((cylinder) => cylinder[key] === item.id).length
    return list.reduce((best, item) => (load(item) < load(best) ? item : best))
  }
  const pin = fewest(train.throws, 'throw')
  const onPin = train.cylinders.filter((cylinder) => cylinder.throw === pin.id)
  const bank = fewest(
    train.banks.filter(({ id: name }) => !onPin.some((cylinder) => cylinder.bank === name)).length > 0
      ? train.banks.filter(({ id: name }) => !onPin.some((cylinder) => cylinder.bank === name))
      : train.banks,
    'bank',
  )
  const axialMm = pin.axialMm + onPin.length * 0.24 * bore(train)
  const next: CrankTrain = {
    ...train,
    cylinders: [...train.cylinders, { id, bank: bank.id, throw: pin.id, axialMm }],
  }
  return { ...next, firingOrder: insertInOrder(next, id, events) }
}

export function removeCylinder(train: CrankTrain, id: string): CrankTrain {
  return {
    ...train,
    cylinders: train.cylinders.filter((cylinder) => cylinder.id !== id),
    firingOrder: train.firingOrder.filter((name) => name !== id),
    collectors: train.collectors
      .map((collector) => ({ ...collector, cylinders: collector.cylinders.filter((name) => name !== id) }))
      .filter((collector) => collector.cylinders.length > 0),
  }
}

type Renamed = 'banks' | 'throws' | 'cylinders'

/** A new name everywhere it is used. */
export function rename(train: CrankTrain, list: Renamed, from: string, to: string): CrankTrain {
  const swap = (id: string) => (id === from ? to : id)
  if (list !== 'cylinders') {
    const key = list === 'banks' ? 'bank' : 'throw'
    return {
      ...train,
      [list]: train[list].map((item) => ({ ...item, id: swap(item.id) })),
      cylinders: train.cylinders.map((cylinder) => ({ ...cylinder, [key]: swap(cylinder[key]) })),
    }
  }
  return {
    ...train,
    cylinders: train.cylinders.map((cylinder) => ({
      ...cylinder,
      id: swap(cylinder.id),
      ...(cylinder.link && { link: { ...cylinder.link, master: swap(cylinder.link.master) } }),
    })),
    firingOrder: train.firingOrder.map(swap),
    collectors: train.collectors.map((collector) => ({
      ...collector,
      cylinders: collector.cylinders.map(swap),
    })),
  }
}

export function addCounterweight(train: CrankTrain): CrankTrain {
  const pin = train.throws[0]
  const radiusMm = 0.6 * (train.shape?.counterweightRadiusMm ?? 0.9 * bore(train))
  const item = {
    id: freshId(ids(train.counterweights), numbers('W')),
    axialMm: pin.axialMm,
    angleDeg: (pin.angleDeg + 180) % 360,
    massKg: 0.5,
    radiusMm,
  }
  return { ...train, counterweights: [...train.counterweights, item] }
}

export function addBalanceShaft(train: CrankTrain): CrankTrain {
  const below = -1.6 * bore(train)
  const item = {
    id: freshId(ids(train.balanceShafts), numbers('S')),
    speedRatio: -1 as const,
    angleDeg: 180,
    unbalanceKgMm: 0,
    axialMm: 0,
    horizontalMm: 0.8 * bore(train) * (train.balanceShafts.length % 2 ? -1 : 1),
    verticalMm: below,
  }
  return { ...train, balanceShafts: [...train.balanceShafts, item] }
}

export function addMain(train: CrankTrain): CrankTrain {
  const places = train.mains.map((main) => main.axialMm)
  const axialMm = places.length > 0 ? Math.max(...places) + pitchOf(places, 1.12 * bore(train)) : 0
  return { ...train, mains: [...train.mains, { id: freshId(ids(train.mains), numbers('M')), axialMm }] }
}

export function addCollector(train: CrankTrain): CrankTrain {
  const id = freshId(ids(train.collectors), letters())
  return { ...train, collectors: [...train.collectors, { id, cylinders: [train.cylinders[0].id] }] }
}

/** Distance between neighbouring throws where all are alike, mm. */
export function throwPitch(train: CrankTrain): number | undefined {
  const sorted = train.throws.map((pin) => pin.axialMm).sort((a, b) => a - b)
  const gaps = sorted.slice(1).map((place, i) => place - sorted[i])
  return gaps.length > 0 && gaps.every((gap) => Math.abs(gap - gaps[0]) < 0.01) && gaps[0] > 0
    ? gaps[0]
    : undefined
}

/** Draws the throws apart or together; cylinders and counterweights keep their place beside their throw. */
export function setThrowPitch(train: CrankTrain, pitch: number): CrankTrain {
  const old = throwPitch(train)
  if (!old) return train
  const middle = train.throws.reduce((sum, pin) => sum + pin.axialMm, 0) / train.throws.length
  const scaled = (place: number) => Number((middle + (place - middle) * (pitch / old)).toPrecision(12))
  const beside = (place: number) => {
    const pin = train.throws.reduce((near, other) =>
      Math.abs(other.axialMm - place) < Math.abs(near.axialMm - place) ? other : near,
    )
    return Number((scaled(pin.axialMm) + place - pin.axialMm).toPrecision(12))
  }
  const moved = (move: (place: number) => number) =>
    function <T extends { axialMm: number }>(item: T): T {
      return { ...item, axialMm: move(item.axialMm) }
    }
  return {
    ...train,
    throws: train.throws.map(moved(scaled)),
    mains: train.mains.map(moved(scaled)),
    cylinders: train.cylinders.map(moved(beside)),
    counterweights: train.counterweights.map(moved(beside)),
  }
}
