import type { Change as TrainChange, Path } from '@/scene/model/path'

export { applyChanges, getAt, setAt, type Path } from '@/scene/model/path'

/** Where a value stands in a scene: in its train or in how it is looked at, and nowhere else. */
export type ScenePath = readonly ['train' | 'view', ...Path]

export interface Change {
  path: ScenePath
  /** Undefined takes the field out. */
  value: unknown
}

/** Changes of a train as changes of the scene that it is in. */
export const inTrain = (changes: readonly TrainChange[]): Change[] =>
  changes.map(({ path, value }) => ({ path: ['train', ...path], value }))
