import type { CrankTrainInput } from '@/scene/model/crank-train'

type Cylinder = CrankTrainInput['cylinders'][number]

/** Every bank, throw, counterweight and balance shaft turned by the same angle about the crank axis. */
export function turnedBy(document: CrankTrainInput, deg: number): CrankTrainInput {
  const turn = <T extends { angleDeg: number }>(items: T[] = []) =>
    items.map((x) => ({ ...x, angleDeg: x.angleDeg + deg }))
  return {
    ...document,
    banks: turn(document.banks),
    throws: turn(document.throws),
    counterweights: turn(document.counterweights),
    balanceShafts: turn(document.balanceShafts),
  }
}

/**
 * The engine seen in a mirror that swaps the two horizontal sides, which then runs the other way: every angle and offset
 * changes sign, and so does the crank angle. What happened at θ happens at −θ.
 */
export function mirrored(document: CrankTrainInput): CrankTrainInput {
  const flip = <T extends { angleDeg: number }>(items: T[] = []) =>
    items.map((x) => ({ ...x, angleDeg: -x.angleDeg }))
  const cycle = document.cycle === 'four-stroke' ? 720 : 360
  const flipCylinder = (c: Cylinder): Cylinder => ({
    ...c,
    ...(c.offsetMm === undefined ? {} : { offsetMm: -c.offsetMm }),
    ...(c.firesAtDeg === undefined ? {} : { firesAtDeg: (cycle - c.firesAtDeg) % cycle }),
    ...(c.link ? { link: { ...c.link, knuckleAngleDeg: -c.link.knuckleAngleDeg } } : {}),
  })
  return {
    ...document,
    cylinderDefaults: { ...document.cylinderDefaults, offsetMm: -(document.cylinderDefaults?.offsetMm ?? 0) },
    banks: flip(document.banks),
    throws: flip(document.throws),
    counterweights: flip(document.counterweights),
    balanceShafts: flip(document.balanceShafts),
    cylinders: document.cylinders.map(flipCylinder),
    firingOrder: [...document.firingOrder].reverse(),
    gas: reversedTrace(document.gas, cycle),
  }
}

/** A pressure trace that runs backwards in time; other gas models know no backwards. */
function reversedTrace(gas: CrankTrainInput['gas'], cycle: number): CrankTrainInput['gas'] {
  if (gas?.model !== 'trace') return gas
  const points = gas.angleDeg.map((x, i) => ({ x: x === -cycle / 2 ? x : -x, p: gas.pressureBar[i] }))
  points.sort((a, b) => a.x - b.x)
  return { model: 'trace', angleDeg: points.map(({ x }) => x), pressureBar: points.map(({ p }) => p) }
}

/** Every length ×k, every mass ×k³: the same engine, larger. */
export function scaled(document: CrankTrainInput, k: number): CrankTrainInput {
  const powers: [RegExp, number][] = [
    [/KgMm2$/, 5],
    [/KgMm$/, 4],
    [/Kg$/, 3],
    [/Mm$/, 1],
    [/heatPerCycleJ$/, 3],
  ]
  const visit = (value: unknown, key: string): unknown => {
    if (Array.isArray(value)) return value.map((v) => visit(v, key))
    if (value && typeof value === 'object')
      return Object.fromEntries(Object.entries(value).map(([name, v]) => [name, visit(v, name)]))
    if (typeof value !== 'number') return value
    const power = powers.find(([pattern]) => pattern.test(key))?.[1] ?? 0
    return value * k ** power
  }
  return visit(document, '') as CrankTrainInput
}

/** The lists of a document in another order; masters may come after their links. */
export function shuffled(document: CrankTrainInput, by: (count: number) => number): CrankTrainInput {
  const shuffle = <T>(items: T[] = []) => {
    const left = [...items]
    const out: T[] = []
    while (left.length > 0) out.push(...left.splice(by(left.length), 1))
    return out
  }
  return {
    ...document,
    banks: shuffle(document.banks),
    throws: shuffle(document.throws),
    cylinders: shuffle(document.cylinders),
    counterweights: shuffle(document.counterweights),
    balanceShafts: shuffle(document.balanceShafts),
    mains: shuffle(document.mains),
  }
}
