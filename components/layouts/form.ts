import { massSplit } from '@/lib/mechanics/balance'
import { MOST_CYLINDERS } from '@/lib/mechanics/layouts/find-layouts'
import type { Criterion, LayoutRequest, Wishes } from '@/lib/mechanics/layouts/layout'
import { searchSize } from '@/lib/mechanics/layouts/space'
import type { Train } from '@/lib/mechanics/train'
import { formatNumber } from '@/lib/units/format'
import { parseQuantity } from '@/lib/units/parse'
import type { Quantity } from '@/lib/units/quantities'
import { fromSi, toSi } from '@/lib/units/units'
import type { CrankTrain } from '@/scene/model/crank-train'
import { criterionWords, wordsOf } from './criteria'

export const importances = { no: 0, some: 1, much: 3, most: 10 } as const
export type Importance = keyof typeof importances

/** The form as it is typed. */
export interface WishForm {
  cylinders: string
  cycle: CrankTrain['cycle']
  banks: 'one' | 'two'
  bankAngles: string
  rods: 'paired' | 'in-turn'
  pins: 'common' | 'split'
  splitMost: string
  splitStep: string
  wishes: Record<Criterion, { importance: Importance; atMost: string }>
}

/** The engine that is on the bench, and wishes that most have. */
export function formFor(document: CrankTrain): WishForm {
  const count = Math.min(MOST_CYLINDERS, document.cylinders.length)
  const [one, other] = document.banks.map(({ angleDeg }) => angleDeg)
  const between = document.banks.length === 2 ? Math.abs(other - one) : 90
  const angle = between > 180 ? 360 - between : between
  const asked = { importance: 'some', atMost: '' } as const
  const not = { importance: 'no', atMost: '' } as const
  return {
    cylinders: `${count}`,
    cycle: document.cycle,
    banks: document.banks.length === 2 ? 'two' : 'one',
    bankAngles: formatNumber(angle || 90, { decimals: Number.isInteger(angle) ? 0 : 1 }),
    rods: angle === 180 || count % 2 === 1 ? 'in-turn' : 'paired',
    pins: 'common',
    splitMost: '60',
    splitStep: '6',
    wishes: {
      unevenness: { importance: 'much', atMost: '' },
      sameBank: not,
      secondForce: asked,
      secondCouple: asked,
      firstForce: asked,
      firstCouple: asked,
      counterweight: asked,
      nearThrow: not,
    },
  }
}

export interface FormProblem {
  field: string
  head: string
  message: string
  mend?: string
}

export type ReadForm = { request: LayoutRequest; problems: [] } | { request: null; problems: FormProblem[] }

/** Bank angles × splits × phasings of a search that ends within some seconds. */
const MOST_REGULAR = 400_000
const MOST_ANGLES = 24
const MOST_SPLITS = 61

/** The form as a request, or everything in it that cannot be taken. `train` gives the masses. */
export function readForm(form: WishForm, train: Train): ReadForm {
  const problems: FormProblem[] = []
  const refuse = (field: string, head: string, message: string, mend?: string) => {
    problems.push({ field, head, message, mend })
    return 0
  }
  const amount = (
    field: string,
    text: string,
    quantity: Quantity,
    low: number,
    high: number,
    mend: string,
  ) => {
    const unit = quantity === 'angle' ? '°' : ''
    const parsed = parseQuantity(text, quantity, unit)
    if (!parsed.ok) return refuse(field, 'Not understood.', parsed.message, mend)
    const value = quantity === 'angle' ? fromSi(parsed.value, '°') : parsed.value
    if (value >= low && value <= high) return value
    return refuse(
      field,
      'Out of range.',
      `${text.trim()} was read as ${value}${unit}; it can be ${low}${unit} to ${high}${unit}.`,
      mend,
    )
  }

  const cylinders = amount('cylinders', form.cylinders, 'count', 1, MOST_CYLINDERS, '8')
  if (cylinders % 1 !== 0)
    refuse(
      'cylinders',
      'Not a whole number.',
      `${cylinders} cylinders cannot be built.`,
      `${Math.round(cylinders)}`,
    )
  const two = form.banks === 'two'
  const paired = two && form.rods === 'paired'
  if (paired && cylinders % 2 === 1)
    refuse(
      'cylinders',
      'An odd number.',
      `${cylinders} cylinders cannot stand two on a throw. Give an even number, or one rod on each throw.`,
      `${cylinders + 1 > MOST_CYLINDERS ? cylinders - 1 : cylinders + 1}`,
    )

  const angles = two ? form.bankAngles.split('/') : []
  const bankAngles = angles.map((text) => amount('bankAngles', text, 'angle', 1, 180, '90'))
  if (angles.length > MOST_ANGLES)
    refuse(
      'bankAngles',
      'Too many at once.',
      `${angles.length} bank angles; one search tries ${MOST_ANGLES}.`,
      '60/72/90/120/180',
    )
  const splits = paired && form.pins === 'split' ? splitsOf(form, amount, refuse) : [0]

  const wishes: Wishes = {}
  for (const { id, quantity } of criterionWords) {
    if (id === 'sameBank' && !two) continue
    const { importance, atMost } = form.wishes[id]
    const typed = atMost.trim()
    const limit =
      typed === '' ? undefined : amount(id, typed, quantity, 0, quantity === 'angle' ? 720 : 1000, '0')
    if (importances[importance] > 0 || limit !== undefined)
      wishes[id] = {
        weight: importances[importance],
        atMost: limit === undefined || id !== 'unevenness' ? limit : toSi(limit, '°'),
      }
  }
  if (problems.length > 0) return { request: null, problems }

  const { rotating, reciprocating } = massSplit(train.cylinders[0])
  const pin = train.throws[train.cylinders[0].throw]
  const rods = train.cylinders.length / train.throws.length
  const request: LayoutRequest = {
    cylinders,
    cycle: toSi(form.cycle === 'four-stroke' ? 720 : 360, '°'),
    rodsPerThrow: paired ? 2 : 1,
    bankAngles: [...new Set(bankAngles)].map((angle) => toSi(angle, '°')),
    splits: splits.map((angle) => toSi(angle, '°')),
    rodOffset: 0,
    balanceFactor: train.balanceFactor,
    rotating: (rotating + pin.unbalance / pin.radius / rods) / reciprocating,
    wishes,
  }
  const { regular } = searchSize(request)
  if (regular <= MOST_REGULAR) return { request, problems: [] }
  refuse(
    splits.length > 1 ? 'splitStep' : 'bankAngles',
    'Too much for one search.',
    `This asks for ${formatNumber(regular, { decimals: 0 })} phasings; one search goes through ${formatNumber(MOST_REGULAR, { decimals: 0 })}. Try fewer angles.`,
    splits.length > 1 ? '6' : '90',
  )
  return { request: null, problems }
}

type Amount = (
  field: string,
  text: string,
  quantity: Quantity,
  low: number,
  high: number,
  mend: string,
) => number

function splitsOf(
  { splitMost, splitStep }: WishForm,
  amount: Amount,
  refuse: (field: string, head: string, message: string, mend?: string) => number,
): number[] {
  const most = amount('splitMost', splitMost, 'angle', 1, 120, '60')
  const step = amount('splitStep', splitStep, 'angle', 0.5, 120, '6')
  if (!(most > 0 && step > 0)) return [0]
  const each = Math.floor(most / step + 1e-9)
  if (2 * each + 1 > MOST_SPLITS) {
    refuse(
      'splitStep',
      'Too fine.',
      `${most}° in steps of ${step}° to either side are ${2 * each + 1} split angles; one search tries ${MOST_SPLITS}.`,
      `${Math.ceil((2 * most) / (MOST_SPLITS - 1))}`,
    )
    return [0]
  }
  return Array.from({ length: 2 * each + 1 }, (_, i) => (i - each) * step)
}

/** What the form asks for, by the names of its wishes. */
export const limitText = (id: Criterion, wishes: Wishes): string => {
  const limit = wishes[id]?.atMost
  const { unit } = wordsOf(id)
  if (limit === undefined) return ''
  const value = id === 'unevenness' ? fromSi(limit, '°') : limit
  return `at most ${formatNumber(value, { decimals: value % 1 === 0 ? 0 : 2 })}${unit === '°' ? '°' : unit === '' ? '' : `\u00a0${unit}`}`
}
