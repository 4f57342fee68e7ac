import type { CrankTrain } from '@/scene/model/crank-train'

/** Whether two documents say the same: one that was stored and read again is another object. */
export const sameTrain = (one: CrankTrain, other: CrankTrain): boolean =>
  one === other || JSON.stringify(one) === JSON.stringify(other)
