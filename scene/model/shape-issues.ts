import type { z } from 'zod'
import type { Issue } from './issue'
import { capital, fieldInWords, say, unitOf, valueAt } from './say'

type ShapeError = z.core.$ZodIssue

/** Nobody reads more of them, and a long list of bad entries would have one each. */
const MOST_ISSUES = 100

/** A schema's refusals of `json` in the words and the form of every other refusal. */
export function shapeIssues(error: z.ZodError, json: unknown): Issue[] {
  return error.issues.slice(0, MOST_ISSUES).map((issue) => {
    const value = valueAt(issue.path, json)
    const unit = unitOf(String(issue.path.findLast((step) => typeof step === 'string') ?? ''))
    const [code, message, fix] = words(issue, capital(fieldInWords(issue.path, json)), value, unit)
    return { path: issue.path.map(String).join('.'), code, message, fix }
  })
}

function words(issue: ShapeError, field: string, value: unknown, unit: string): [string, string, string] {
  if (value === undefined) {
    const what = issue.code === 'invalid_value' ? choices(issue.values) : expected(issue, unit)
    return ['missing', `Missing: ${field.charAt(0).toLowerCase() + field.slice(1)}.`, `Give ${what}.`]
  }
  switch (issue.code) {
    case 'invalid_type':
      if (typeof value === 'number' && issue.expected === 'number')
        return ['not-finite', `${field} is not a finite number.`, `Give ${expected(issue, unit)}.`]
      return [
        'wrong-type',
        `${field} is ${shown(value)}, not ${expected(issue, unit)}.`,
        `Give ${expected(issue, unit)}.`,
      ]
    case 'too_small':
    case 'too_big':
      return bound(issue, field, value, unit)
    case 'invalid_value':
      return [
        'unknown-choice',
        `${field} is ${shown(value)}, which is none of the choices.`,
        `Give ${choices(issue.values)}.`,
      ]
    case 'invalid_union':
      return [
        'unknown-choice',
        `${field} is ${shown(value)}, which is none of the choices.`,
        `Give ${choices(unionChoices(issue))}.`,
      ]
    default:
      return ['out-of-range', `${field} is ${shown(value)}, which does not fit.`, 'Give another value.']
  }
}

function bound(
  issue: Extract<ShapeError, { code: 'too_small' | 'too_big' }>,
  field: string,
  value: unknown,
  unit: string,
): [string, string, string] {
  const small = issue.code === 'too_small'
  const limit = Number(small ? issue.minimum : issue.maximum)
  const side = small
    ? issue.inclusive
      ? 'at least'
      : 'more than'
    : issue.inclusive
      ? 'at most'
      : 'less than'
  if (issue.origin === 'array' || issue.origin === 'string') {
    const count = (value as string | unknown[]).length
    const things = issue.origin === 'array' ? 'entries' : 'characters'
    const need = small ? `${side} ${say(limit, '')} is needed` : `${side} ${say(limit, '')} can be`
    return [
      small ? 'too-few' : 'too-many',
      `${field}: ${say(count, '')} ${things} given, ${need}.`,
      `Give ${side} ${say(limit, '')}.`,
    ]
  }
  const understood = typeof value === 'number' ? say(value, unit) : shown(value)
  return [
    'out-of-range',
    `${field} cannot be ${understood}: it must be ${side} ${say(limit, unit)}.`,
    `Give ${side} ${say(limit, unit)}.`,
  ]
}

const expected = (issue: ShapeError, unit: string) => {
  const type = issue.code === 'invalid_type' ? issue.expected : 'object'
  if (type === 'number') return unit === '' ? 'a number' : `a number of ${unit === '°' ? 'degrees' : unit}`
  return (
    { string: 'text', array: 'a list', boolean: 'true or false' }[type as string] ??
    'an object with its fields'
  )
}

const unionChoices = (issue: ShapeError) =>
  'options' in issue && Array.isArray(issue.options) ? issue.options : []

const choices = (values: readonly unknown[]) => values.map((value) => shown(value)).join(' or ')

const shown = (value: unknown) => {
  const text = JSON.stringify(value) ?? 'nothing'
  return text.length > 60 ? `${text.slice(0, 57)}…` : text
}
