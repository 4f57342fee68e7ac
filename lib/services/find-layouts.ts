import type { findLayouts as contract, LayoutsAnswer } from '@/lib/contracts/layouts'
import type { BodyOf } from '@/lib/contracts/operation'
import { refused } from '@/lib/errors/problem'
import { findLayouts as search, type LayoutSearch } from '@/lib/mechanics/layouts/find-layouts'
import type { Criterion, Layout, LayoutRequest } from '@/lib/mechanics/layouts/layout'
import { searchSize } from '@/lib/mechanics/layouts/space'
import { formatNumber } from '@/lib/units/format'
import { fromSi, toSi } from '@/lib/units/units'

/** Phasings that one request may ask for: some seconds of work. */
const most = { natural: 4_000_000, regular: 150_000 } as const

type Body = BodyOf<typeof contract>
type WishName = keyof Body['wishes']

const names: Record<Criterion, WishName> = {
  firstForce: 'firstOrderForce',
  firstCouple: 'firstOrderCouple',
  secondForce: 'secondOrderForce',
  secondCouple: 'secondOrderCouple',
  counterweight: 'counterweight',
  unevenness: 'unevennessDeg',
  sameBank: 'sameBank',
  nearThrow: 'sameOrNextThrow',
}

/** Layouts that come nearest to the wishes, for anybody who asks. Other requests are served between its steps. */
export async function findLayouts(body: Body): Promise<LayoutsAnswer> {
  const request = requestOf(body)
  refuseTooLarge(body, request)
  const steps = search(request, { keep: body.keep })
  for (;;) {
    const step = steps.next()
    if (step.done) return answerOf(step.value)
    await new Promise<void>((resolve) => setImmediate(resolve))
  }
}

function requestOf(body: Body): LayoutRequest {
  const { cylinders, banks, rodsPerThrow = banks, splitAnglesDeg } = body
  if (rodsPerThrow === 2 && banks === 1)
    throw refuse('rodsPerThrow', 'One bank puts one rod on a throw, not 2.', 'Give 1 rod, or 2 banks.')
  if (rodsPerThrow === 2 && cylinders % 2 === 1)
    throw refuse(
      'cylinders',
      `${cylinders} cylinders cannot stand two on a throw.`,
      'Give an even number, or 1 rod a throw.',
    )
  if (rodsPerThrow === 1 && splitAnglesDeg.some((split) => split !== 0))
    throw refuse(
      'splitAnglesDeg',
      'A throw with one rod has no pin to split.',
      'Give [0], or 2 rods a throw.',
    )
  const wishes = Object.entries(names).flatMap(([criterion, name]) => {
    const wish = body.wishes[name]
    if (!wish) return []
    const atMost =
      wish.atMost === undefined || name !== 'unevennessDeg' ? wish.atMost : toSi(wish.atMost, '°')
    return [[criterion, { weight: wish.weight, atMost }]]
  })
  return {
    cylinders,
    cycle: toSi(body.cycle === 'four-stroke' ? 720 : 360, '°'),
    rodsPerThrow,
    bankAngles: banks === 1 ? [] : distinct(body.bankAnglesDeg).map((angle) => toSi(angle, '°')),
    splits: distinct(splitAnglesDeg).map((angle) => toSi(angle, '°')),
    divisions: body.stepsDeg && distinct(body.stepsDeg.map((step) => Math.round(360 / step))),
    rodOffset: body.rodOffset,
    balanceFactor: body.balanceFactor,
    rotating: body.rotatingMass,
    wishes: Object.fromEntries(wishes),
  }
}

const distinct = (values: readonly number[]) => [...new Set(values)]
const refuse = (path: string, message: string, fix: string) =>
  refused([{ path, code: 'no-such-layout', message, fix }])

function refuseTooLarge({ stepsDeg }: Body, request: LayoutRequest) {
  const size = searchSize(request)
  const large = (path: string, phasings: number, limit: number, fix: string) =>
    refused([
      {
        path,
        code: 'search-too-large',
        message: `This asks for up to ${whole(phasings)} phasings; one search goes through ${whole(limit)}.`,
        fix,
      },
    ])
  const variants = 'Give fewer bank angles or split angles.'
  if (size.regular > most.regular)
    throw stepsDeg
      ? large('stepsDeg', size.regular, most.regular, `Give coarser steps. ${variants}`)
      : large('splitAnglesDeg', size.regular, most.regular, variants)
  if (size.natural > most.natural)
    throw large('cylinders', size.natural, most.natural, `Give fewer cylinders. ${variants}`)
}

const whole = (value: number) => formatNumber(value, { decimals: 0 })
const degrees = (angle: number) => fromSi(angle, '°')

function answerOf(found: LayoutSearch): LayoutsAnswer {
  const steps = [found.naturalDivisions, ...found.regularDivisions].map((divisions) => 360 / divisions)
  return {
    layouts: found.layouts.map(layoutAnswer),
    evaluated: found.phasings,
    orders: found.orders,
    stepsDeg: distinct(steps),
    capped: found.capped,
    nearestMiss: found.miss && {
      layout: layoutAnswer(found.miss.layout),
      missed: found.miss.missed.map((criterion) => names[criterion]),
      impossible: found.miss.impossible.map((criterion) => names[criterion]),
    },
  }
}

function layoutAnswer(layout: Layout): LayoutsAnswer['layouts'][number] {
  const { force1, couple1, force2, couple2 } = layout
  return {
    bankAngleDeg: layout.bankAngle === null ? null : degrees(layout.bankAngle),
    splitDeg: degrees(layout.split),
    throwAnglesDeg: layout.throwAngles.map(degrees),
    order: layout.order.map((cylinder) => cylinder + 1),
    intervalsDeg: layout.intervals.map(degrees),
    even: layout.even,
    firstOrderForce: layout.firstForce,
    firstOrderCouple: layout.firstCouple,
    secondOrderForce: layout.secondForce,
    secondOrderCouple: layout.secondCouple,
    counterweight: layout.counterweight,
    unevennessDeg: degrees(layout.unevenness),
    sameBank: layout.sameBank,
    sameThrow: layout.sameThrow,
    sameOrNextThrow: layout.nearThrow,
    alike: layout.alike,
    bare: { force1, couple1, force2, couple2 },
    counterweights: layout.counterweights,
    score: layout.score,
    foremost: layout.foremost,
  }
}
