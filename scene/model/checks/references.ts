import type { CrankTrain } from '../crank-train'
import { refuse, type Issue } from '../issue'
import { listed } from '../say'

const lists = {
  banks: 'bank',
  throws: 'throw',
  cylinders: 'cylinder',
  counterweights: 'counterweight',
  balanceShafts: 'balance shaft',
  mains: 'main bearing',
  collectors: 'collector',
} as const

/** Every name given once, and every name that is used given. */
export function referenceIssues(document: CrankTrain): Issue[] {
  const known = {
    bank: namesOf(document.banks),
    throw: namesOf(document.throws),
    cylinder: namesOf(document.cylinders),
  }
  const unknown = (path: string, kind: keyof typeof known, name: string, code = `unknown-${kind}`) =>
    known[kind].has(name)
      ? []
      : refuse(
          [path],
          code,
          `There is no ${kind} “${name}”.`,
          `Use one of ${listed([...known[kind]].slice(0, 12))}, or add it.`,
        )
  return [
    ...(Object.keys(lists) as (keyof typeof lists)[]).flatMap((list) =>
      repeated(
        document[list].map(({ id }) => id),
        (index) => `${list}.${index}.id`,
        (id) => `Two entries are called ${lists[list]} “${id}”: a name must mean one.`,
      ),
    ),
    ...document.cylinders.flatMap((cylinder, index) => [
      ...unknown(`cylinders.${index}.bank`, 'bank', cylinder.bank),
      ...unknown(`cylinders.${index}.throw`, 'throw', cylinder.throw),
      ...(cylinder.link
        ? unknown(`cylinders.${index}.link.master`, 'cylinder', cylinder.link.master, 'unknown-master')
        : []),
    ]),
    ...document.collectors.flatMap((collector, index) => [
      ...collector.cylinders.flatMap((name, place) =>
        unknown(`collectors.${index}.cylinders.${place}`, 'cylinder', name),
      ),
      ...repeated(
        collector.cylinders,
        (place) => `collectors.${index}.cylinders.${place}`,
        (name) => `Collector “${collector.id}” names cylinder “${name}” twice.`,
      ),
    ]),
    ...orderIssues(document, known.cylinder),
  ]
}

const namesOf = (entries: readonly { id: string }[]) => new Set(entries.map(({ id }) => id))

function repeated(
  names: readonly string[],
  path: (index: number) => string,
  message: (name: string) => string,
): Issue[] {
  const places = new Map<string, number[]>()
  names.forEach((name, index) => places.set(name, [...(places.get(name) ?? []), index]))
  return [...places].flatMap(([name, at]) =>
    at.length < 2
      ? []
      : refuse(at.map(path), 'duplicate-id', message(name), 'Keep one, or give the other another name.'),
  )
}

/** The firing order is one field: its refusals say which entries they mean. */
export function orderIssues(
  { firingOrder, cylinders }: Pick<CrankTrain, 'firingOrder' | 'cylinders'>,
  known: ReadonlySet<string> = namesOf(cylinders),
): Issue[] {
  const times = new Map<string, number>()
  for (const name of firingOrder) times.set(name, (times.get(name) ?? 0) + 1)
  const unknown = [...times.keys()].filter((name) => !known.has(name))
  const repeats = [...times].filter(([name, count]) => count > 1 && known.has(name)).map(([name]) => name)
  const missing = cylinders.map(({ id }) => id).filter((name) => !times.has(name))
  const about = (names: string[], code: string, message: string, fix: string) =>
    names.length === 0 ? [] : refuse(['firingOrder'], code, message, fix)
  const count = `${firingOrder.length} entries for ${cylinders.length} ${cylinders.length === 1 ? 'cylinder' : 'cylinders'}`
  return [
    ...about(
      unknown,
      'unknown-cylinder',
      `The firing order has ${count}; there is no cylinder ${listed(unknown)}.`,
      `Take ${listed(unknown)} out.`,
    ),
    ...about(
      repeats,
      'firing-order-repeats',
      `The firing order has ${count}; cylinder ${listed(repeats)} appears more than once${missing.length > 0 ? ` and ${listed(missing)} is missing` : ''}.`,
      'Name every cylinder once.',
    ),
    ...about(
      missing,
      'firing-order-misses',
      `The firing order has ${count}; cylinder ${listed(missing)} is missing.`,
      `Put ${listed(missing)} in where it fires.`,
    ),
  ]
}
