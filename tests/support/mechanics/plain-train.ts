import type { CrankTrainInput } from '@/scene/model/crank-train'

const DEG = Math.PI / 180

/**
 * The document in SI, read by the rules of the document format alone and by nothing of the program's own code,
 * so that a slip of a unit or of a default in the program cannot hide in the reference.
 */
export interface PlainCylinder {
  id: string
  bank: number
  bankId: string
  throwIndex: number
  z: number
  radius: number
  rod: number
  offset: number
  area: number
  compression: number
  pistonMass: number
  rodMass: number
  rodCg: number // from the big end
  rodInertia: number
  bearing: number
  oil: number
  firesAtDeg?: number
  link?: { master: number; radius: number; angle: number }
}

export interface PlainTrain {
  document: CrankTrainInput
  cycleDeg: number
  cylinders: PlainCylinder[]
  throws: { angle: number; z: number; unbalance: number; radius: number }[]
  referenceZ: number
}

export function plainTrain(document: CrankTrainInput): PlainTrain {
  const { masses, banks, throws } = document
  const cylinders = document.cylinders.map((own): PlainCylinder => {
    const size = { offsetMm: 0, ...defined(document.cylinderDefaults ?? {}), ...defined(own) }
    const mass = {
      pistonPinKg: 0,
      ringsKg: 0,
      locksKg: 0,
      bigEndBearingKg: 0,
      oilAllowanceKg: 0,
      ...defined(masses ?? {}),
      ...defined(own),
    }
    const rod = mass.rod!
    const length = size.rodLengthMm! / 1000
    const cg = rod.cgFromBigEndMm / 1000
    const bank = banks.find((b) => b.id === own.bank)!
    return {
      id: own.id,
      bank: bank.angleDeg * DEG,
      bankId: bank.id,
      throwIndex: throws.findIndex((t) => t.id === own.throw),
      z: own.axialMm / 1000,
      radius: size.strokeMm! / 2000,
      rod: length,
      offset: size.offsetMm / 1000,
      area: (Math.PI / 4) * (size.boreMm! / 1000) ** 2,
      compression: size.compressionRatio!,
      pistonMass: mass.pistonKg! + mass.pistonPinKg + mass.ringsKg + mass.locksKg,
      rodMass: rod.massKg,
      rodCg: cg,
      rodInertia: rod.inertiaKgMm2 === undefined ? rod.massKg * cg * (length - cg) : rod.inertiaKgMm2 / 1e6,
      bearing: mass.bigEndBearingKg,
      oil: mass.oilAllowanceKg,
      firesAtDeg: own.firesAtDeg,
      link: own.link && {
        master: document.cylinders.findIndex((c) => c.id === own.link!.master),
        radius: own.link.knuckleRadiusMm / 1000,
        angle: own.link.knuckleAngleDeg * DEG,
      },
    }
  })
  const places = cylinders.map((c) => c.z)
  return {
    document,
    cycleDeg: document.cycle === 'four-stroke' ? 720 : 360,
    cylinders,
    throws: throws.map((t, i) => ({
      angle: t.angleDeg * DEG,
      z: t.axialMm / 1000,
      unbalance: (t.unbalanceKgMm ?? 0) / 1000,
      radius: cylinders.find((c) => c.throwIndex === i)?.radius ?? 0,
    })),
    referenceZ:
      document.referenceAxialMm === undefined
        ? (Math.min(...places) + Math.max(...places)) / 2
        : document.referenceAxialMm / 1000,
  }
}

function defined<T extends object>(value: T): Partial<T> {
  return Object.fromEntries(Object.entries(value).filter(([, v]) => v !== undefined)) as Partial<T>
}
