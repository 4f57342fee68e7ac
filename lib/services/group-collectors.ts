import type { CollectorsAnswer, groupCollectors as contract } from '@/lib/contracts/firing'
import type { BodyOf } from '@/lib/contracts/operation'
import { refused } from '@/lib/errors/problem'
import { bestCollectorGroups, type CollectorGrouping } from '@/lib/mechanics/collector-groups'
import { usualWindow } from '@/lib/mechanics/exhaust-pulses'
import type { Train } from '@/lib/mechanics/train'
import { fromSi, toSi } from '@/lib/units/units'
import { readTrain } from '@/scene/model/read-train'
import { under } from './scene-document'

const degrees = (angle: number) => fromSi(angle, '°')

/** The best groupings of a train's cylinders into collectors, for anybody who asks. */
export function groupCollectors(body: BodyOf<typeof contract>): CollectorsAnswer {
  const read = readTrain(body.train)
  if (!read.ok) throw refused(under('train', read.issues))
  const { train } = read
  refuseMisfits(train, body)
  const usual = usualWindow(train)
  const { exhaustOpensDeg, windowDeg, count } = body
  const window = {
    opens: exhaustOpensDeg === undefined ? usual.opens : toSi(exhaustOpensDeg, '°'),
    length: windowDeg === undefined ? usual.length : toSi(windowDeg, '°'),
  }
  const { groupings, complete } = bestCollectorGroups(train, count, { window })
  return {
    window: { opensDeg: degrees(window.opens), lengthDeg: degrees(window.length) },
    groupings: groupings.map((grouping) => answerOf(train, grouping)),
    complete,
  }
}

function refuseMisfits({ cylinders, cycle }: Train, body: BodyOf<typeof contract>) {
  if (body.count > cylinders.length)
    throw refused([
      {
        path: 'count',
        code: 'too-many-collectors',
        message: `${body.count} collectors are more than the ${cylinders.length} cylinders there are.`,
        fix: `Give ${cylinders.length} or fewer.`,
      },
    ])
  const whole = Math.round(degrees(cycle))
  const over = (['exhaustOpensDeg', 'windowDeg'] as const).filter((key) => (body[key] ?? 0) > whole)
  if (over.length > 0)
    throw refused(
      over.map((path) => ({
        path,
        code: 'out-of-range',
        message: `${body[path]}° is more than the ${whole}° of one cycle.`,
        fix: `Give an angle up to ${whole}°.`,
      })),
    )
}

const answerOf = (
  { cylinders }: Train,
  grouping: CollectorGrouping,
): CollectorsAnswer['groupings'][number] => ({
  groups: grouping.groups.map((group, index) => {
    const { pulses, gapSpread, overlapSpread, worst } = grouping.pulses[index]
    return {
      cylinders: group.cylinders.map((cylinder) => cylinders[cylinder].id),
      intervalsDeg: group.intervals.map(degrees),
      spreadDeg: degrees(group.spread),
      pulses: pulses.map(({ cylinder, gap, overlap }) => ({
        cylinder: cylinders[cylinder].id,
        gapDeg: degrees(gap),
        overlapDeg: degrees(overlap),
      })),
      gapSpreadDeg: degrees(gapSpread),
      overlapSpreadDeg: degrees(overlapSpread),
      worstCylinder: cylinders[pulses[worst].cylinder].id,
    }
  }),
  worstSpreadDeg: degrees(grouping.worstSpread),
  totalSpreadDeg: degrees(grouping.totalSpread),
  overlapDeg: degrees(grouping.overlap),
  crossings: grouping.crossings,
})
