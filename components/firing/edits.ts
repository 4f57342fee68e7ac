import type { CrankTrain } from '@/scene/model/crank-train'
import type { PhasingProposal } from '@/scene/model/read-phasing'
import { inTrain, type Change } from '@/scene/session/path'

/** Edits of the document, each one undo step. */

/** Another order; firing angles that cylinders state belong to the old one and go. */
export const orderChanges = ({ cylinders }: CrankTrain, order: readonly string[]): Change[] => [
  { path: ['train', 'firingOrder'], value: [...order] },
  ...inTrain(
    cylinders.flatMap(({ firesAtDeg }, index) =>
      firesAtDeg === undefined ? [] : [{ path: ['cylinders', index, 'firesAtDeg'], value: undefined }],
    ),
  ),
]

/** An order with the top dead centre that each cylinder fires at, degrees by place in the order. */
export const turnsChanges = (
  { cycle, cylinders }: CrankTrain,
  order: readonly string[],
  anglesDeg: readonly number[],
): Change[] => [
  { path: ['train', 'firingOrder'], value: [...order] },
  ...inTrain(
    cylinders.map(({ id }, index) => ({
      path: ['cylinders', index, 'firesAtDeg'],
      value: Number(anglesDeg[order.indexOf(id)].toFixed(6)) % (cycle === 'two-stroke' ? 360 : 720),
    })),
  ),
]

/** Throws and the order they fire in, together: neither would be taken without the other. */
export const phasingChanges = (train: CrankTrain, { order, throws }: PhasingProposal): Change[] => [
  ...inTrain(throws.map(({ angleDeg }, index) => ({ path: ['throws', index, 'angleDeg'], value: angleDeg }))),
  ...orderChanges(train, order),
]

/** Collectors named A, B, C… */
export const collectorChanges = (groups: readonly (readonly string[])[]): Change[] => [
  {
    path: ['train', 'collectors'],
    value: groups.map((cylinders, index) => ({ id: collectorName(index), cylinders: [...cylinders] })),
  },
]

export const collectorName = (index: number) => String.fromCharCode(65 + index)
