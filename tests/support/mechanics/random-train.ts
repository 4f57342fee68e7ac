import type { CrankTrainInput } from '@/scene/model/crank-train'
import { deadCentre } from './linkage'
import { plainTrain } from './plain-train'

/** A small seeded generator (mulberry32, public domain by T. Ettinger): the same seed, the same train. */
export function randomSource(seed: number) {
  let state = seed >>> 0
  const next = () => {
    state = (state + 0x6d2b79f5) >>> 0
    let t = Math.imul(state ^ (state >>> 15), state | 1)
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61)
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296
  }
  const between = (low: number, high: number) => low + (high - low) * next()
  const whole = (low: number, high: number) => low + Math.floor((high - low + 1) * next())
  const chance = (share: number) => next() < share
  const pick = <T>(items: readonly T[]) => items[whole(0, items.length - 1)]
  return { between, whole, chance, pick }
}

type Source = ReturnType<typeof randomSource>
type Gas = NonNullable<CrankTrainInput['gas']>

export interface Wish {
  cylinders?: number
  gas?: Gas['model']
  links?: boolean
}

/** A crank train that turns: 1 to 16 unequal cylinders, banks, offsets, shared and split pins, links, any gas model. */
export function randomTrain(seed: number, wish: Wish = {}): CrankTrainInput {
  const source = randomSource(seed)
  const { between, whole, chance, pick } = source
  const count = wish.cylinders ?? whole(1, 16)
  const cycle = chance(0.25) ? 'two-stroke' : 'four-stroke'
  const banks = Array.from({ length: whole(1, Math.min(4, count)) }, (_, i) => ({
    id: `B${i + 1}`,
    angleDeg: between(-180, 180),
  }))
  const stroke = between(40, 160)
  const throws = Array.from({ length: whole(Math.ceil(count / 4), count) }, (_, i) => ({
    id: `T${i + 1}`,
    angleDeg: between(0, 360),
    axialMm: 100 * i + between(-5, 5),
    unbalanceKgMm: chance(0.7) ? between(0, 80) : undefined,
    strokeMm: chance(0.3) ? stroke * between(0.9, 1.1) : stroke,
  }))
  // Two cylinders of one throw stand on two banks, so that no two of a train are at top dead centre together.
  const taken = new Set<string>()
  const freeBank = (throwId: string) => {
    const free = banks.filter((bank) => !taken.has(`${throwId} ${bank.id}`))
    if (free.length === 0) free.push({ id: `B${banks.length + 1}`, angleDeg: between(-180, 180) })
    const bank = pick(free)
    if (!banks.includes(bank)) banks.push(bank)
    taken.add(`${throwId} ${bank.id}`)
    return bank.id
  }
  const cylinders = Array.from({ length: count }, (_, i): CrankTrainInput['cylinders'][number] => {
    const pin = i < throws.length ? throws[i] : pick(throws)
    const rodLengthMm = pin.strokeMm * between(1.5, 2.2)
    return {
      id: `${i + 1}`,
      bank: freeBank(pin.id),
      throw: pin.id,
      axialMm: pin.axialMm + between(-30, 30),
      strokeMm: pin.strokeMm,
      rodLengthMm,
      offsetMm: chance(0.5) ? between(-0.12, 0.12) * pin.strokeMm : undefined,
      boreMm: chance(0.3) ? stroke * between(0.7, 1.3) : undefined,
      pistonKg: chance(0.4) ? between(0.2, 0.9) : undefined,
      rod: chance(0.5) ? randomRod(source, rodLengthMm) : undefined,
      bigEndBearingKg: chance(0.3) ? between(0, 0.08) : undefined,
    }
  })
  if (wish.links ?? chance(0.4)) addLinks(source, cylinders)
  const document: CrankTrainInput = {
    format: 'crank-train/1',
    title: `random train ${seed}`,
    cycle,
    rotation: pick(['clockwise', 'counterclockwise'] as const),
    operating: { maxRpm: 6000 },
    cylinderDefaults: { boreMm: stroke * between(0.8, 1.2), compressionRatio: between(7, 16) },
    masses: {
      pistonKg: between(0.2, 0.9),
      pistonPinKg: between(0, 0.2),
      ringsKg: between(0, 0.05),
      locksKg: chance(0.5) ? 0.002 : undefined,
      rod: randomRod(source, stroke * 1.5),
      bigEndBearingKg: chance(0.5) ? between(0, 0.08) : undefined,
      oilAllowanceKg: chance(0.5) ? 0.004 : undefined,
    },
    balanceFactor: between(0, 1),
    banks,
    throws: throws.map(({ id, angleDeg, axialMm, unbalanceKgMm }) => ({
      id,
      angleDeg,
      axialMm,
      unbalanceKgMm,
    })),
    cylinders,
    counterweights: Array.from({ length: whole(0, 4) }, (_, i) => ({
      id: `W${i + 1}`,
      axialMm: between(-60, 100 * throws.length),
      angleDeg: between(0, 360),
      massKg: between(0.1, 2),
      radiusMm: between(20, 90),
    })),
    balanceShafts: Array.from({ length: whole(0, 3) }, (_, i) => ({
      id: `S${i + 1}`,
      speedRatio: pick([-2, -1, 1, 2] as const),
      angleDeg: between(0, 360),
      unbalanceKgMm: between(1, 20),
      axialMm: between(-50, 400),
      horizontalMm: between(-100, 100),
      verticalMm: between(-100, 100),
    })),
    mains: Array.from({ length: whole(0, throws.length + 1) }, (_, i) => ({
      id: `M${i + 1}`,
      axialMm: 100 * i - 50 + between(-10, 10),
    })),
    firingOrder: [],
    collectors: [],
    gas: randomGas(source, cycle, wish.gas),
    crankcasePressureBar: chance(0.5) ? between(0.9, 1.2) : undefined,
    crankMassKg: between(5, 40),
    referenceAxialMm: chance(0.3) ? between(-50, 300) : undefined,
  }
  document.firingOrder = possibleOrder(source, document)
  document.collectors = [{ id: 'all', cylinders: document.firingOrder.slice(0, Math.max(1, count - 1)) }]
  return JSON.parse(JSON.stringify(document)) as CrankTrainInput
}

function randomRod({ between, chance }: Source, lengthMm: number) {
  const massKg = between(0.25, 0.9)
  const cgFromBigEndMm = lengthMm * between(0.26, 0.38)
  const twoMass = massKg * cgFromBigEndMm * (lengthMm - cgFromBigEndMm)
  return { massKg, cgFromBigEndMm, inertiaKgMm2: chance(0.7) ? twoMass * between(0.7, 1.2) : undefined }
}

/** Hangs some later cylinders of a throw on the first one of it. */
function addLinks({ between, chance }: Source, cylinders: CrankTrainInput['cylinders']) {
  for (const c of cylinders) {
    const master = cylinders.find((other) => other.throw === c.throw)!
    if (master === c || chance(0.3)) continue
    const knuckleRadiusMm = between(0.15, 0.25) * master.rodLengthMm!
    c.link = { master: master.id, knuckleRadiusMm, knuckleAngleDeg: between(-150, 150) }
    c.rodLengthMm = c.strokeMm! * between(1.3, 1.8)
    c.bigEndBearingKg = 0
    // A knuckle set across the cylinder carries the link's foot far to the side.
    const sideways = c.strokeMm! / 2 + knuckleRadiusMm + Math.abs(c.offsetMm ?? 0)
    c.rodLengthMm = Math.max(c.rodLengthMm, sideways * 1.5)
  }
}

function randomGas({ between, chance, pick }: Source, cycle: string, wished?: Gas['model']): Gas {
  const model = wished ?? pick(['none', 'trace', 'heat-release'] as const)
  const half = cycle === 'four-stroke' ? 360 : 180
  if (model === 'none') return { model }
  if (model === 'trace') {
    const angleDeg = [-half]
    while (angleDeg.at(-1)! < half - 20) angleDeg.push(angleDeg.at(-1)! + between(3, 17))
    return {
      model,
      angleDeg,
      pressureBar: angleDeg.map((x) => between(0.8, 1.5) + 50 * Math.exp(-(((x - 12) / 30) ** 2))),
    }
  }
  return {
    model,
    intakePressureBar: between(0.7, 2.2),
    exhaustPressureBar: between(1, 1.5),
    gamma: between(1.25, 1.4),
    heatPerCycleJ: between(200, 2500),
    combustionStartDeg: between(-30, -2),
    combustionDurationDeg: between(30, 80),
    wiebeA: chance(0.5) ? between(4, 7) : undefined,
    wiebeM: between(0.5, 3),
    intakeClosesDeg: between(-150, -90),
    exhaustOpensDeg: between(90, 150),
    blowdownDeg: chance(0.5) ? between(8, 25) : undefined,
  }
}

/** An order that the dead centres allow: a turn drawn for each cylinder, then sorted, then started anywhere. */
function possibleOrder({ whole }: Source, document: CrankTrainInput) {
  const train = plainTrain(document)
  const events = train.cylinders
    .map((c, i) => ({
      id: c.id,
      at: (deadCentre(train, i, 'top') * 180) / Math.PI + 360 * whole(0, train.cycleDeg / 360 - 1),
    }))
    .sort((a, b) => a.at - b.at)
  const start = whole(0, events.length - 1)
  return [...events.slice(start), ...events.slice(0, start)].map((e) => e.id)
}
