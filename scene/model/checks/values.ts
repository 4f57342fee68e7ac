import type { CrankTrain } from '../crank-train'
import { commonPath, cylinderValues, fieldPath, type CylinderFieldName } from '../cylinder-values'
import { refuse, type Issue } from '../issue'
import { capital, fieldInWords, say, unitOf } from '../say'

/** Values that every cylinder needs from somewhere, and values that must agree with each other. */
export function valueIssues(document: CrankTrain): Issue[] {
  return [...missingValues(document), ...centresOfGravity(document), ...speeds(document), ...mains(document)]
}

function missingValues(document: CrankTrain): Issue[] {
  const needed: CylinderFieldName[] = ['boreMm', 'strokeMm', 'rodLengthMm', 'pistonKg', 'rod']
  if (document.gas.model === 'heat-release') needed.push('compressionRatio')
  const common: Record<string, unknown> = { ...document.cylinderDefaults, ...document.masses }
  return needed.flatMap((field) => {
    const without = document.cylinders.find((cylinder) => (cylinder[field] ?? common[field]) === undefined)
    if (without === undefined) return []
    const unit = unitOf(field)
    return refuse(
      [commonPath(field)],
      'missing',
      `${capital(fieldInWords([field], document))} is missing for cylinder ${without.id}.`,
      `Give ${unit === '' ? 'it' : `a number of ${unit}`} for all cylinders together, or for each by itself.`,
    )
  })
}

function centresOfGravity(document: CrankTrain): Issue[] {
  return document.cylinders.flatMap((cylinder, index) => {
    const { rod, rodLengthMm } = cylinderValues(document, cylinder)
    if (rod === undefined || rodLengthMm === undefined || rod.cgFromBigEndMm <= rodLengthMm) return []
    return refuse(
      [`${fieldPath(document, index, 'rod')}.cgFromBigEndMm`, fieldPath(document, index, 'rodLengthMm')],
      'centre-of-gravity-outside',
      `The rod of cylinder ${cylinder.id} has its centre of gravity ${say(rod.cgFromBigEndMm, 'mm')} from the big end, beyond its small end at ${say(rodLengthMm, 'mm')}.`,
      `Give a distance between 0 and ${say(rodLengthMm, 'mm')}; a quarter to a third of the length is usual.`,
    )
  })
}

function speeds({ operating = {} }: CrankTrain): Issue[] {
  const { idleRpm: idle, ratedRpm: rated, maxRpm: max } = operating
  const out = (fields: string[], message: string) =>
    refuse(
      fields.map((field) => `operating.${field}`),
      'speeds-out-of-order',
      message,
      'Idle is below rated, and rated is not above maximum.',
    )
  const issues: Issue[] = []
  if (idle !== undefined && rated !== undefined && idle >= rated)
    issues.push(
      ...out(['idleRpm', 'ratedRpm'], `Idle ${say(idle, 'rpm')} must be below rated ${say(rated, 'rpm')}.`),
    )
  if (rated !== undefined && max !== undefined && rated > max)
    issues.push(
      ...out(
        ['ratedRpm', 'maxRpm'],
        `Rated ${say(rated, 'rpm')} is above the maximum of ${say(max, 'rpm')}.`,
      ),
    )
  return issues
}

function mains({ mains: bearings }: CrankTrain): Issue[] {
  return bearings.flatMap((bearing, index) => {
    const other = bearings.findIndex(({ axialMm }, place) => place < index && axialMm === bearing.axialMm)
    if (other < 0) return []
    return refuse(
      [`mains.${other}.axialMm`, `mains.${index}.axialMm`],
      'mains-coincide',
      `Main bearings ${bearings[other].id} and ${bearing.id} stand at one place, ${say(bearing.axialMm, 'mm')}: a load cannot be shared between them.`,
      'Move one, or take it out.',
    )
  })
}
