import type { LayoutSearch } from '@/lib/mechanics/layouts/find-layouts'
import { judgeOf } from '@/lib/mechanics/layouts/judge'
import { criteria, type Criterion, type Layout, type LayoutRequest } from '@/lib/mechanics/layouts/layout'
import { formatNumber } from '@/lib/units/format'
import { fromSi } from '@/lib/units/units'
import { figureText, wordsOf } from './criteria'
import { limitText } from './form'

const whole = (value: number) => formatNumber(value, { decimals: 0 })
export const degreesText = (angle: number) => {
  const value = Number(fromSi(angle, '°').toFixed(2))
  return formatNumber(value, { decimals: Number.isInteger(value) ? 0 : Number.isInteger(value * 10) ? 1 : 2 })
}

/** 0/90/270/180 */
export const throwsText = ({ throwAngles }: Layout) => throwAngles.map(degreesText).join('/')
export const orderText = ({ order }: Layout) => order.map((cylinder) => cylinder + 1).join('-')

/** 0/120/240 with pins split 30°, at 90° */
export function layoutText(layout: Layout, request: LayoutRequest): string {
  const split = layout.split === 0 ? '' : ` with pins split ${degreesText(layout.split)}°`
  const bank =
    request.bankAngles.length > 1 && layout.bankAngle !== null ? ` at ${degreesText(layout.bankAngle)}°` : ''
  return `${throwsText(layout)}${split}${bank}`
}

const list = (items: readonly string[]) =>
  items.length < 2 ? (items[0] ?? '') : `${items.slice(0, -1).join(', ')} and ${items[items.length - 1]}`

/** What was gone through. */
export function searchedWords(found: LayoutSearch, request: LayoutRequest): string {
  const steps = [...new Set([found.naturalDivisions, ...found.regularDivisions])].map(
    (n) => `${degreesText((2 * Math.PI) / n)}°`,
  )
  const only = found.regularDivisions.length === 0 && request.wishes.unevenness?.atMost !== undefined
  const grid = only
    ? `throws at steps of ${steps[0]}, where alone it can fire evenly`
    : `throws at steps of ${list(steps)}`
  const variants = [
    request.bankAngles.length > 1 ? `${request.bankAngles.length} bank angles` : '',
    request.splits.length > 1 ? `${request.splits.length} split angles` : '',
  ].filter(Boolean)
  const each = variants.length > 0 ? `, for ${list(variants)}` : ''
  const left = found.capped ? ' The search stopped at its limit with phasings left.' : ''
  return `Looked at ${count(found.phasings, 'phasing')} and ${count(found.orders, 'whole firing order')}: ${grid}${each}. Phasings that mirroring or turning end for end makes alike are counted once, and orders that could not be kept were left early.${left}`
}

const count = (n: number, noun: string) => `${whole(n)} ${noun}${n === 1 ? '' : 's'}`

const samePhasing = (one: Layout, other: Layout) =>
  one.split === other.split &&
  one.bankAngle === other.bankAngle &&
  one.throwAngles.every((angle, k) => Math.abs(angle - other.throwAngles[k]) < 1e-6)

/** Why the first is first: what it reaches, and what the next phasing loses by. */
export function firstWords({ layouts }: LayoutSearch, request: LayoutRequest): string {
  const [first] = layouts
  const judge = judgeOf(request)
  const asked = criteria.filter((criterion) => request.wishes[criterion])
  const reached = asked.map((criterion) =>
    first[criterion] < 1e-9
      ? wordsOf(criterion).best
      : `${wordsOf(criterion).said} ${figureText(criterion, first)}`,
  )
  const opening =
    asked.length === 0
      ? `${layoutText(first, request)} is first: nothing is wished, and all figures together are least.`
      : `${layoutText(first, request)} is first: ${list(reached)}.`
  const next = layouts.find((layout) => !samePhasing(layout, first))
  if (!next) return `${opening} No other phasing fulfils the wishes.`
  const worst = (cost: (criterion: Criterion, figure: number) => number) =>
    criteria.reduce<{ criterion: Criterion; more: number }>(
      (most, criterion) => {
        const more = cost(criterion, next[criterion]) - cost(criterion, first[criterion])
        return more > most.more ? { criterion, more } : most
      },
      { criterion: criteria[0], more: 0 },
    )
  const against = ({ criterion }: { criterion: Criterion }) =>
    `${wordsOf(criterion).said}, ${figureText(criterion, next)} against ${figureText(criterion, first)}`
  const tie = next.score - first.score < 1e-9
  const { criterion, more } = worst(tie ? judge.rest : judge.cost)
  if (more < 1e-9) return `${opening} The next phasing, ${layoutText(next, request)}, is as good.`
  return tie
    ? `${opening} The next phasing, ${layoutText(next, request)}, is as good in all that is wished; it loses by ${against({ criterion })}.`
    : `${opening} The next phasing, ${layoutText(next, request)}, loses most by ${against({ criterion })}.`
}

/** Nothing found: which wishes exclude all, and by how much the nearest layout misses. */
export function missWords({ miss }: LayoutSearch, request: LayoutRequest): string {
  if (!miss) return 'No phasing on these grids lets the cylinders fire one after the other.'
  const wish = (criterion: Criterion) => `${wordsOf(criterion).said} ${limitText(criterion, request.wishes)}`
  const why =
    miss.impossible.length > 0
      ? `Nothing on these grids has ${list(miss.impossible.map(wish))}.`
      : 'Each wish can be fulfilled by itself, but not all together.'
  const by = miss.missed.map(
    (criterion) =>
      `${wordsOf(criterion).said} ${figureText(criterion, miss.layout)}, asked ${limitText(criterion, request.wishes)}`,
  )
  return `No layout fulfils all limits. ${why} The nearest is ${layoutText(miss.layout, request)}: ${list(by)}.`
}
