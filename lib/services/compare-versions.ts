import { read } from '@/db/client'
import { sceneById } from '@/db/queries/scenes'
import { versionOf } from '@/db/queries/scene-versions'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { compareVersions as contract, VersionChangesAnswer } from '@/lib/contracts/versions'
import type { QueryOf } from '@/lib/contracts/operation'
import { notFound } from '@/lib/errors/problem'
import { scaleFor } from '@/lib/units/quantities'
import { fromSi, type UnitName } from '@/lib/units/units'
import { compareVersions as changesBetween, type Effect } from '@/scene/frame/compare-versions'
import { asShown, type Changed, type Value } from '@/scene/model/change-words'
import type { SceneChange } from '@/scene/model/compare-scenes'
import { versionSummary } from './scene-answers'
import { storedScene } from './scene-document'

/** What changed between two versions, worked out anew from what is stored. */
export async function compareVersions(
  person: Person | null,
  id: string,
  { from, to, speedRpm, units }: QueryOf<typeof contract>,
): Promise<VersionChangesAnswer> {
  const [older, newer] = await read(async (tx) => {
    authorise(person, 'scene.read', await sceneById(tx, id))
    return [await versionOf(tx, id, from), await versionOf(tx, id, to)]
  })
  if (!older || !newer) throw notFound('version')
  const scenes = [storedScene(older.document), storedScene(newer.document)] as const
  const found = changesBetween(...scenes, units, speedRpm)
  const change = (one: SceneChange) => ({
    ...{ key: one.key, paths: one.paths, is: one.is },
    ...inUnits(one),
    belowPrecision: !asShown(one, units).seen,
  })
  return {
    from: versionSummary(older),
    to: versionSummary(newer),
    speedRpm: found.speedRpm,
    parameters: found.parameters.map((one) => ({
      ...change(one),
      parts: one.parts,
      effects: one.effects.map(effectInUnits),
    })),
    view: found.view.map(change),
    effects: found.effects.map(effectInUnits),
    drawn: found.drawn,
  }
}

const effectInUnits = (effect: Effect) => {
  const shown = inUnits(effect)
  return { ...shown, below: effect.below === null ? null : inUnit(effect.below, shown.unit) }
}

/** Unrounded, both in the unit that the greater of them is shown in. */
function inUnits({ name, quantity, was, now }: Changed & { name: string }) {
  const most = Math.max(0, ...[was, now].map((one) => (typeof one === 'number' ? Math.abs(one) : 0)))
  const unit: UnitName = quantity ? scaleFor(most, quantity, 'si').unit : ''
  return { name, quantity, unit, was: inUnit(was, unit), now: inUnit(now, unit) }
}

const inUnit = <V extends Value>(value: V, unit: UnitName) =>
  typeof value === 'number' ? fromSi(value, unit) : value
