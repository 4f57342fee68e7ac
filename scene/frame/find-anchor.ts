import { formatQuantity } from '@/lib/units/format'
import { scaleFor, type System } from '@/lib/units/quantities'
import type { Anchor, PartChange, Standing } from '@/scene/model/anchor'
import type { CrankTrain } from '@/scene/model/crank-train'
import { partTraits, type Trait } from './part-traits'

export interface FoundAnchor {
  standing: Standing
  /** Which of the part's own parameters have changed, as they are shown. */
  changes: PartChange[]
}

type Pinned = Pick<Anchor, 'partId' | 'speedRpm' | 'units'>

/**
 * A pinned part of one version in another: found again by what the document calls it, so that what was put in beside it
 * moves no pin. A change that is not seen at the precision a figure is shown in is none.
 */
export function findAnchor(anchor: Pinned, older: CrankTrain, newer: CrankTrain): FoundAnchor {
  const speed = (anchor.speedRpm * Math.PI) / 30
  const now = partTraits(newer, anchor.partId, speed)
  if (!now) return { standing: 'gone', changes: [] }
  if (older === newer) return { standing: 'same', changes: [] }
  const before = partTraits(older, anchor.partId, speed) ?? []
  const names = [...new Set([...before, ...now].map(({ name }) => name))]
  const changes = names.flatMap((name) => {
    const of = (traits: readonly Trait[]) => traits.find((trait) => trait.name === name)
    return changeOf(name, of(before), of(now), anchor.units)
  })
  return { standing: changes.length > 0 ? 'changed' : 'same', changes }
}

function changeOf(
  name: string,
  before: Trait | undefined,
  now: Trait | undefined,
  system: System,
): PartChange[] {
  const sizes = [before, now].flatMap((trait) =>
    typeof trait?.value === 'number' ? [Math.abs(trait.value)] : [],
  )
  const quantity = before?.quantity ?? now?.quantity
  const scale = quantity && scaleFor(Math.max(...sizes), quantity, system)
  const text = (trait: Trait | undefined) => {
    if (!trait) return '–'
    if (typeof trait.value === 'string') return trait.value
    return quantity
      ? formatQuantity(trait.value, quantity, system, undefined, scale).text
      : String(trait.value)
  }
  const [from, to] = [text(before), text(now)]
  return from === to ? [] : [{ name, from, to, unit: scale?.unit ?? '' }]
}
