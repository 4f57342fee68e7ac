import type { CrankTrain } from '../crank-train'
import { refuse, type Issue } from '../issue'
import { say } from '../say'

type Gas = CrankTrain['gas']
type Trace = Extract<Gas, { model: 'trace' }>
type HeatRelease = Extract<Gas, { model: 'heat-release' }>

/** How near the trace's first point must be to the beginning of the cycle, degrees. */
const START_WITHIN = 1e-6

export function gasIssues({ gas, cycle }: CrankTrain): Issue[] {
  const half = cycle === 'four-stroke' ? 360 : 180
  if (gas.model === 'trace') return traceIssues(gas, half)
  return gas.model === 'heat-release' ? heatReleaseIssues(gas, half) : []
}

function traceIssues({ angleDeg, pressureBar }: Trace, half: number): Issue[] {
  const count = angleDeg.length
  if (count !== pressureBar.length)
    return refuse(
      ['gas.angleDeg', 'gas.pressureBar'],
      'trace-lengths-differ',
      `The pressure trace has ${say(count, '')} angles and ${say(pressureBar.length, '')} pressures.`,
      'Give one pressure an angle.',
    )
  if (count < 2)
    return refuse(
      ['gas.angleDeg'],
      'trace-too-short',
      `The pressure trace has ${count} ${count === 1 ? 'point' : 'points'}: a cycle needs two at least.`,
      `Give points from ${say(-half, '°')} on over the whole cycle.`,
    )
  const back = angleDeg.findIndex((angle, index) => index > 0 && angle <= angleDeg[index - 1])
  if (back > 0)
    return refuse(
      [`gas.angleDeg.${back}`],
      'trace-unsorted',
      `Point ${back + 1} of the pressure trace goes from ${say(angleDeg[back - 1], '°')} to ${say(angleDeg[back], '°')}: angles must rise.`,
      'Sort the points by angle and keep one at each angle.',
    )
  const last = angleDeg[count - 1]
  const whole = (message: string) =>
    refuse(
      ['gas.angleDeg'],
      'trace-not-whole-cycle',
      message,
      `Begin at ${say(-half, '°')} and end short of ${say(half, '°')}, angles counted from the firing top dead centre.`,
    )
  if (Math.abs(angleDeg[0] + half) > START_WITHIN)
    return whole(
      `The pressure trace begins at ${say(angleDeg[0], '°')}, not at ${say(-half, '°')} where the cycle does.`,
    )
  if (last >= half)
    return whole(`The pressure trace ends at ${say(last, '°')}, where the next cycle has begun.`)
  const widest = angleDeg.reduce(
    (gap, angle, index) => (index === 0 ? gap : Math.max(gap, angle - angleDeg[index - 1])),
    0,
  )
  if (half - last > 2 * widest)
    return whole(
      `The pressure trace ends at ${say(last, '°')}: the last ${say(half - last, '°')} of the cycle are missing, where its points stand ${say(widest, '°')} apart at most.`,
    )
  return []
}

function heatReleaseIssues(gas: HeatRelease, half: number): Issue[] {
  const {
    intakeClosesDeg: closes,
    exhaustOpensDeg: opens,
    combustionStartDeg: start,
    combustionDurationDeg: duration,
  } = gas
  const out = (fields: string[], message: string, fix: string) =>
    refuse(
      fields.map((field) => `gas.${field}`),
      'heat-release-angles',
      message,
      fix,
    )
  const issues: Issue[] = []
  if (closes < -half)
    issues.push(
      ...out(
        ['intakeClosesDeg'],
        `The intake closes at ${say(closes, '°')}, before the cycle begins at ${say(-half, '°')}.`,
        `Give an angle between ${say(-half, '°')} and 0°.`,
      ),
    )
  if (opens > half)
    issues.push(
      ...out(
        ['exhaustOpensDeg'],
        `The exhaust opens at ${say(opens, '°')}, after the cycle ends at ${say(half, '°')}.`,
        `Give an angle between 0° and ${say(half, '°')}.`,
      ),
    )
  if (start + duration <= closes)
    issues.push(
      ...out(
        ['combustionStartDeg', 'combustionDurationDeg', 'intakeClosesDeg'],
        `Combustion is over at ${say(start + duration, '°')}, before the intake has closed at ${say(closes, '°')}: no heat would count.`,
        `Let combustion end after ${say(closes, '°')}.`,
      ),
    )
  if (start >= opens)
    issues.push(
      ...out(
        ['combustionStartDeg', 'exhaustOpensDeg'],
        `Combustion starts at ${say(start, '°')}, when the exhaust has been open since ${say(opens, '°')}.`,
        `Start combustion before ${say(opens, '°')}.`,
      ),
    )
  return issues
}
