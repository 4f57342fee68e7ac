import type { VersionChangesAnswer } from '@/lib/contracts/versions'
import { toSi } from '@/lib/units/units'
import type { Value } from '@/scene/model/change-words'

type Change = VersionChangesAnswer['view'][number]
type Effect = VersionChangesAnswer['effects'][number]

/** An answer's figures in SI, as everything that shows figures takes them. */
export function changesOf(answer: VersionChangesAnswer) {
  return {
    parameters: answer.parameters.map((one) => ({ ...changeOf(one), effects: one.effects.map(effectOf) })),
    view: answer.view.map(changeOf),
    effects: answer.effects.map(effectOf),
  }
}

const changeOf = <C extends Change>(one: C) => ({ ...one, ...valuesOf(one) })

const effectOf = (one: Effect) => ({
  ...one,
  ...valuesOf(one),
  below: one.below === null ? null : toSi(one.below, one.unit),
})

const valuesOf = ({ was, now, unit }: Pick<Change, 'was' | 'now' | 'unit'>) => {
  const inSi = (value: Value) => (typeof value === 'number' ? toSi(value, unit) : value)
  return { was: inSi(was), now: inSi(now) }
}
