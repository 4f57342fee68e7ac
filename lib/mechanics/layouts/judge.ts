import { criteria, type Criterion, type Figures, type LayoutRequest } from './layout'

/** Figures within this of a limit keep it. */
const WITHIN = 1e-6

/** What the figures of a layout count: shared by everything that ranks or shuts out. */
export interface Judge {
  /** Whether the figure keeps the wish's limit. */
  keeps(criterion: Criterion, figure: number): boolean
  /** Its part of the score, and of what breaks ties. Neither falls as the figure grows. */
  cost(criterion: Criterion, figure: number): number
  rest(criterion: Criterion, figure: number): number
  wished: readonly Criterion[]
  /** What brings each criterion to about 0…1. */
  scale: Figures
}

/**
 * Scales that bring every figure to about 0…1: the mean interval; the number of cylinders for counts and forces; the sum of
 * |z| of all cylinders for couples; the bob-weight of one throw for counterweights.
 */
export function scales(request: LayoutRequest): Figures {
  const { cylinders, cycle, rodsPerThrow } = request
  const throws = cylinders / rodsPerThrow
  let arms = 0
  for (let k = 0; k < throws; k++) arms += rodsPerThrow * Math.abs(k - (throws - 1) / 2)
  const couple = arms || 1
  const bob = rodsPerThrow * (request.rotating + request.balanceFactor)
  return {
    firstForce: cylinders,
    firstCouple: couple,
    secondForce: cylinders,
    secondCouple: couple,
    counterweight: bob || 1,
    unevenness: cycle / cylinders,
    sameBank: cylinders,
    nearThrow: cylinders,
  }
}

/** Scores by weights and shuts out by limits. */
export function judgeOf(request: LayoutRequest): Judge {
  const scale = scales(request)
  const { wishes } = request
  const weight = perCriterion((criterion) => (wishes[criterion] ? (wishes[criterion].weight ?? 1) : 0))
  const limit = perCriterion((criterion) => (wishes[criterion]?.atMost ?? Infinity) + WITHIN)
  const other = perCriterion((criterion) => (wishes[criterion] ? 0 : 1))
  return {
    scale,
    keeps: (criterion, figure) => figure <= limit[criterion],
    cost: (criterion, figure) => (weight[criterion] * figure) / scale[criterion],
    rest: (criterion, figure) => (other[criterion] * figure) / scale[criterion],
    wished: criteria.filter((criterion) => weight[criterion] > 0),
  }
}

/** Scores by how far the limits are missed, and shuts nothing out: its first layout is the nearest miss. */
export function missJudgeOf(request: LayoutRequest, limited: readonly Criterion[]): Judge {
  const scale = scales(request)
  const miss = (criterion: Criterion, figure: number) => {
    const over = figure - (request.wishes[criterion]?.atMost ?? Infinity)
    return over > WITHIN ? over / scale[criterion] : 0
  }
  const plain = judgeOf(request)
  const counts = perCriterion((criterion) => (limited.includes(criterion) ? 1 : 0))
  return {
    scale,
    keeps: () => true,
    cost: (criterion, figure) => (counts[criterion] ? miss(criterion, figure) : 0),
    rest: (criterion, figure) => plain.cost(criterion, figure) + plain.rest(criterion, figure),
    wished: [],
  }
}

const perCriterion = (value: (criterion: Criterion) => number): Figures =>
  Object.fromEntries(criteria.map((criterion) => [criterion, value(criterion)])) as Figures
