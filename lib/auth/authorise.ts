import { notFound, notSignedIn, Problem } from '@/lib/errors/problem'
import { allow, roleIn, type Operation, type Person } from './access'

/** Lets through or throws. What belongs to another workshop is said not to exist. */
export function authorise(
  person: Person | null,
  operation: Operation,
  resource: { workshopId: string } | undefined,
  what = 'scene',
): asserts person is Person {
  if (!person) throw notSignedIn()
  if (!resource || !roleIn(person, resource.workshopId)) throw notFound(what)
  if (!allow(person, operation, resource)) {
    throw new Problem(
      'not-allowed',
      `Your role in this workshop, ${roleIn(person, resource.workshopId)}, does not include this.`,
      'Ask an owner of the workshop.',
    )
  }
}
