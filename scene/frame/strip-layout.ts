import type { CrankTrain } from '@/scene/model/crank-train'

/** Where everything of the firing strip stands, in pixels: a pure function of the document, its events and the width. */
interface StripLane {
  cylinder: string
  y: number
  /** Degrees in the cycle. */
  fires: number
}

export interface StripChain {
  y: number
  /** From event to event, in order; the last one closes the cycle. */
  at: number[]
  spans: number[]
}

interface StripGroup {
  bank: string
  index: number
  collector: string | null
  top: number
  bottom: number
  lanes: StripLane[]
  chain: StripChain | null
}

export interface StripLayout {
  left: number
  right: number
  top: number
  /** The graduated edge. */
  rule: number
  height: number
  groups: StripGroup[]
  /** Chains of collectors that are not simply a bank. */
  collectors: { id: string; members: string; chain: StripChain }[]
  narrow: boolean
}

/** Below this width there is no room for chains and every second figure of the rule. */
export const NARROW = 400

/** Few lanes spread over this height; many make the strip taller. */
const USUAL_HEIGHT = 190

interface StripInput {
  train: CrankTrain
  events: { id: string; at: number }[]
  cycleDeg: number
  width: number
}

export function stripLayout({ train, events, cycleDeg, width }: StripInput): StripLayout {
  const narrow = width < NARROW
  const bare = width < 620
  const left = bare ? 58 : 112
  const top = narrow ? 22 : 28
  const firesOf = (id: string) => events.find((event) => event.id === id)?.at ?? 0
  const banks = train.banks.filter((bank) => train.cylinders.some((cylinder) => cylinder.bank === bank.id))
  const grouped = banks.length > 3 && banks.length === train.cylinders.length ? [null] : banks
  const chained = !narrow
  const room = USUAL_HEIGHT - top - 26 - grouped.length * (chained ? 19 : 6)
  const count = train.cylinders.length
  const pitch = Math.min(22, Math.max(count > 16 ? 8 : count > 10 ? 11 : 13, room / count))
  let y = top
  const groups = grouped.map((bank, index): StripGroup => {
    const members = train.cylinders
      .filter((cylinder) => bank === null || cylinder.bank === bank.id)
      .toSorted((a, b) => a.axialMm - b.axialMm)
    const lanes = members.map((cylinder, i) => ({
      cylinder: cylinder.id,
      y: y + 8.5 + pitch * i,
      fires: firesOf(cylinder.id),
    }))
    const bottom = lanes.at(-1)!.y + 1.5
    const chain = chained
      ? chainOf(
          lanes.map((lane) => lane.fires),
          cycleDeg,
          bottom + 7.8,
        )
      : null
    const group = {
      bank: bank?.id ?? '',
      index: bank ? train.banks.indexOf(bank) : index,
      collector: collectorOf(
        train,
        members.map((cylinder) => cylinder.id),
      ),
      top: y,
      bottom,
      lanes,
      chain,
    }
    y = bottom + (chained ? 19 : 6)
    return group
  })
  const collectors = chained
    ? train.collectors
        .filter((collector) => !groups.some((group) => group.collector === collector.id))
        .map((collector, i) => ({
          id: collector.id,
          members: collector.cylinders.join('-'),
          chain: chainOf(collector.cylinders.map(firesOf), cycleDeg, y + 6 + 14 * i)!,
        }))
    : []
  const rule = y + 14 * collectors.length
  return { left, right: width - 16, top, rule, height: rule + 26, groups, collectors, narrow: bare }
}

function chainOf(fires: number[], cycleDeg: number, y: number): StripChain {
  const at = fires.toSorted((a, b) => a - b)
  const spans = at.map((angle, i) => (i + 1 < at.length ? at[i + 1] - angle : at[0] + cycleDeg - angle))
  return { y, at, spans }
}

/** The collector that takes exactly these cylinders. */
const collectorOf = (train: CrankTrain, members: string[]) =>
  train.collectors.find(
    (collector) =>
      collector.cylinders.length === members.length &&
      collector.cylinders.every((id) => members.includes(id)),
  )?.id ?? null
