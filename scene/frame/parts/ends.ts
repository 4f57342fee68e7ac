import { crankPart } from '../rig-parts'
import type { Room } from '../room'
import { addFlywheel, addFreeEnd, flywheelRadius } from './flywheel'

/** Nose and flywheel; where along the crank each ends. */
export function addEnds(
  { parts, train, shape, layout }: Room,
  reach: number,
): { free: number; drive: number } {
  const { journals } = layout
  const ends = { free: 0, drive: 0 }
  const nose = parts.mesh('free end', 0, (builder) => {
    ends.free = addFreeEnd(builder, shape.mainRadius, journals[0].from)
  })
  parts.add({ ...crankPart, id: 'free-end', kind: 'free-end', label: 'Free end' }, nose)
  const least = Math.max(1.7 * shape.mainRadius, 0.6 * reach)
  const wheel = parts.mesh('flywheel', 0, (builder) => {
    ends.drive = addFlywheel(builder, {
      radius: flywheelRadius(train.inertia.flywheel, least, 1.5 * reach),
      journal: shape.mainRadius,
      from: journals[journals.length - 1].to,
      clear: Math.max(...train.cylinders.map(({ axial, bore }) => axial + 0.6 * bore)),
    })
  })
  const named = { id: 'flywheel', kind: 'flywheel', group: 'flywheel', label: 'Flywheel' } as const
  parts.add({ ...crankPart, ...named, body: parts.newBody() }, wheel)
  return ends
}
