import { classDoubts } from './doubts/class'
import { crankDoubts } from './doubts/crank'
import { firingDoubts } from './doubts/firing'
import type { CrankTrain } from './crank-train'
import type { Doubt } from './doubts/doubt'
import type { System } from '@/lib/units/quantities'

export type { Doubt } from './doubts/doubt'

/** What is probably not meant, or unusual, in a document that runs. Nothing of it is refused. */
export const doubtsOf = (document: CrankTrain, system: System = 'si'): Doubt[] => [
  ...classDoubts(document, system),
  ...crankDoubts(document, system),
  ...firingDoubts(document),
]

type Acknowledged = NonNullable<CrankTrain['acknowledged']>[number]

const sameValue = (one: number | undefined, other: number) =>
  one === undefined || Math.abs(one - other) <= 1e-9 * Math.max(1, Math.abs(other))

/** The reason that somebody has given for standing by an unusual value, if any. */
export const acknowledgementOf = (document: CrankTrain, doubt: Doubt): Acknowledged | undefined =>
  document.acknowledged?.find(
    ({ code, path, value }) => code === doubt.code && path === doubt.path && sameValue(value, doubt.value),
  )

/** The document with a reason for a doubt; whatever was said of it before is replaced. */
export function acknowledge(document: CrankTrain, doubt: Doubt, reason: string, at?: string): CrankTrain {
  const { code, path, value } = doubt
  const entry: Acknowledged = { code, path, value, reason: reason.trim(), ...(at && { at }) }
  return { ...withdraw(document, doubt), acknowledged: [...others(document, doubt), entry] }
}

/** The document without the reason. */
export function withdraw(document: CrankTrain, doubt: Doubt): CrankTrain {
  const { acknowledged: _all, ...rest } = document
  const left = others(document, doubt)
  return left.length > 0 ? { ...rest, acknowledged: left } : rest
}

const others = ({ acknowledged = [] }: CrankTrain, doubt: Doubt) =>
  acknowledged.filter(({ code, path }) => code !== doubt.code || path !== doubt.path)
