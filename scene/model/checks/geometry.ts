import { linkReach } from '@/lib/mechanics/link-rod'
import { rodPaths } from '@/lib/mechanics/rod-path'
import type { CrankTrain } from '../crank-train'
import { cylinderValues, fieldPath } from '../cylinder-values'
import { refuse, type Issue } from '../issue'
import { listed, say } from '../say'
import { toTrain } from '../to-train'

/** Nearer than this to its end, a link's rod angle is taken as not turning. */
const FULL_REACH = 1 - 1e-6

/** Whether the crank can turn. Takes a document whose references are known and whose values are given. */
export function geometryIssues(document: CrankTrain): Issue[] {
  const issues = [...strokes(document), ...links(document), ...rods(document)]
  return issues.length > 0 ? issues : turningLinks(document)
}

function strokes(document: CrankTrain): Issue[] {
  return document.throws.flatMap((pin) => {
    const on = document.cylinders.flatMap((cylinder, index) =>
      cylinder.throw === pin.id
        ? [{ id: cylinder.id, index, strokeMm: cylinderValues(document, cylinder).strokeMm }]
        : [],
    )
    const values = [...new Set(on.map(({ strokeMm }) => strokeMm))]
    if (values.length < 2) return []
    const each = values.map((stroke) => {
      const ids = on.filter(({ strokeMm }) => strokeMm === stroke).map(({ id }) => id)
      return `${say(stroke, 'mm')} for ${listed(ids)}`
    })
    return refuse(
      on.map(({ index }) => fieldPath(document, index, 'strokeMm')),
      'strokes-disagree',
      `Cylinders on throw ${pin.id} share its radius, but their strokes are ${listed(each)}.`,
      'Give them one stroke, or put them on throws of their own.',
    )
  })
}

function links(document: CrankTrain): Issue[] {
  return document.cylinders.flatMap((cylinder, index) => {
    if (!cylinder.link) return []
    const path = `cylinders.${index}.link.master`
    const fix = 'Name a cylinder whose rod is on the crank pin itself.'
    if (cylinder.link.master === cylinder.id)
      return refuse(
        [path],
        'link-on-itself',
        `The link rod of cylinder ${cylinder.id} names itself as its master.`,
        fix,
      )
    const master = document.cylinders.find(({ id }) => id === cylinder.link?.master)
    if (master?.link)
      return refuse(
        [path],
        'link-on-link',
        `The link rod of cylinder ${cylinder.id} hangs on cylinder ${master.id}, which is itself a link rod on ${master.link.master}.`,
        fix,
      )
    if (master && master.throw !== cylinder.throw)
      return refuse(
        [`cylinders.${index}.throw`, path],
        'link-on-another-throw',
        `Cylinder ${cylinder.id} is on throw ${cylinder.throw}, but its master ${master.id} turns on throw ${master.throw}.`,
        `Put cylinder ${cylinder.id} on throw ${master.throw}.`,
      )
    return []
  })
}

function rods(document: CrankTrain): Issue[] {
  return document.cylinders.flatMap((cylinder, index) => {
    if (cylinder.link) return []
    const { strokeMm, rodLengthMm: rod, offsetMm } = cylinderValues(document, cylinder)
    const [radius, offset] = [strokeMm / 2, Math.abs(offsetMm)]
    if (rod > radius + offset) return []
    const sum = `${say(radius, 'mm')} + ${say(offset, 'mm')} = ${say(radius + offset, 'mm')}`
    return refuse(
      [
        fieldPath(document, index, 'rodLengthMm'),
        fieldPath(document, index, 'strokeMm'),
        fieldPath(document, index, 'offsetMm'),
      ],
      'rod-too-short',
      offset > radius && rod > radius
        ? `Offset ${say(offsetMm, 'mm')} of cylinder ${cylinder.id} leaves no full turn: throw + offset = ${sum} is not less than the rod of ${say(rod, 'mm')}.`
        : `The rod of cylinder ${cylinder.id} is too short to turn: ${say(rod, 'mm')} must be more than throw + offset = ${sum}.`,
      `Use a rod longer than ${say(radius + offset, 'mm')}, a shorter stroke or less offset.`,
    )
  })
}

function turningLinks(document: CrankTrain): Issue[] {
  const paths = rodPaths(toTrain(document))
  return document.cylinders.flatMap((cylinder, index) => {
    if (!cylinder.link) return []
    const reach = linkReach(paths, index)
    if (reach < FULL_REACH) return []
    const rod = cylinderValues(document, cylinder).rodLengthMm
    return refuse(
      [
        fieldPath(document, index, 'rodLengthMm'),
        `cylinders.${index}.link.knuckleRadiusMm`,
        `cylinders.${index}.link.knuckleAngleDeg`,
      ],
      'link-cannot-turn',
      `The link rod of cylinder ${cylinder.id} cannot turn a whole turn: its knuckle gets ${say(Math.round(reach * rod * 100) / 100, 'mm')} beside the cylinder axis, and the rod is ${say(rod, 'mm')} long.`,
      'Use a longer link rod or a smaller knuckle radius, or put the knuckle on the side of its own cylinder.',
    )
  })
}
