'use client'

import { StatusMark } from '@/components/ui/icon'
import { quantityText } from '@/lib/units/format'
import type { System } from '@/lib/units/quantities'
import { asShown, type Changed } from '@/scene/model/change-words'
import type { SceneChange } from '@/scene/model/compare-scenes'

export interface FiguredEffect extends Changed {
  name: string
  below: number | null
}

export interface FiguredChange extends SceneChange {
  parts?: readonly string[]
  effects?: readonly FiguredEffect[]
}

interface Props {
  changes: readonly FiguredChange[]
  /** What follows from several changes together. */
  effects?: { title: string; rows: readonly FiguredEffect[] }
  system: System
  heads: { was: string; now: string }
  /** The number of the row of the parts list, where a change has one. */
  numberOf?(change: SceneChange): number | null
  onPart?(parts: readonly string[]): void
  label: string
}

/** What was set otherwise, each with what follows from it, both values in one unit. */
export function ChangeTable({ changes, effects, system, heads, numberOf, onPart, label }: Props) {
  return (
    <table className="diff changes" aria-label={label}>
      <thead>
        <tr>
          <th scope="col">
            <span className="vh">What</span>
          </th>
          <th scope="col" className="r">
            {heads.was}
          </th>
          <th scope="col" className="r">
            {heads.now}
          </th>
          <th scope="col">
            <span className="vh">Unit</span>
          </th>
        </tr>
      </thead>
      {changes.map((change) => (
        <tbody key={change.key}>
          <ChangeRow change={change} system={system} number={numberOf?.(change) ?? null} onPart={onPart} />
          {change.effects?.map((effect) => (
            <EffectRow key={effect.name} effect={effect} system={system} />
          ))}
        </tbody>
      ))}
      {effects && effects.rows.length > 0 ? (
        <tbody>
          <tr className="h">
            <th scope="rowgroup" colSpan={4}>
              {effects.title}
            </th>
          </tr>
          {effects.rows.map((effect) => (
            <EffectRow key={effect.name} effect={effect} system={system} />
          ))}
        </tbody>
      ) : null}
    </table>
  )
}

interface RowProps {
  change: FiguredChange
  system: System
  number: number | null
  onPart?(parts: readonly string[]): void
}

function ChangeRow({ change, system, number, onPart }: RowProps) {
  const { was, now, unit } = asShown(change, system)
  const { name, parts = [], quantity, is } = change
  const named = (
    <>
      {number === null ? null : (
        <span className="ball2">
          <span className="vh">Row </span>
          {number}
        </span>
      )}
      {onPart && parts.length > 0 ? (
        <button type="button" className="part-link" onClick={() => onPart(parts)}>
          {name}
        </button>
      ) : (
        name
      )}
    </>
  )
  const words = quantity === null && Math.max(was.length, now.length) > 8
  if (!words)
    return (
      <tr className="h">
        <th scope="row">{named}</th>
        <td className="n was">{was}</td>
        <td className="n">{now}</td>
        <td className="u">{unit}</td>
      </tr>
    )
  return (
    <>
      <tr className="h">
        <th scope="row" colSpan={4}>
          {named}
        </th>
      </tr>
      <tr className="e said">
        <td colSpan={4}>
          {is === 'added' ? `added: ${now}` : is === 'removed' ? `taken out: ${was}` : `${was}, now ${now}`}
        </td>
      </tr>
    </>
  )
}

function EffectRow({ effect, system }: { effect: FiguredEffect; system: System }) {
  const { was, now, unit } = asShown(effect, system)
  const { name, below, quantity } = effect
  return (
    <>
      <tr className="e">
        <th scope="row">{name}</th>
        <td className="n was">{was}</td>
        <td className="n">{now}</td>
        <td className="u">{unit}</td>
      </tr>
      {below !== null && quantity ? (
        <tr className="x">
          <td colSpan={4}>
            <span className="st mon">
              <StatusMark kind="monitor" />
              below {quantityText(below, quantity, system)}
            </span>
          </td>
        </tr>
      ) : null}
    </>
  )
}
