/**
 * The crank train as the kernel sees it: SI and radians, every default filled in, every reference an index.
 * Built once per document by scene/model/to-train; never mutated.
 *
 * Angles are positive in the direction of rotation, zero straight up. `axial` runs from the free end to the drive end.
 */
export interface Train {
  title: string
  /** Crank angle of one working cycle: 4π (four-stroke) or 2π (two-stroke). */
  cycle: number
  /** Seen from the free end. Only mirrors the picture. */
  rotation: 'clockwise' | 'counterclockwise'
  operating: { idle?: number; rated?: number; max?: number } // rad/s
  balanceFactor: number
  banks: { id: string; angle: number }[]
  throws: ThrowPin[]
  cylinders: Cylinder[]
  counterweights: { id: string; axial: number; angle: number; mass: number; radius: number }[]
  balanceShafts: BalanceShaft[]
  /** Sorted by axial position. */
  mains: { id: string; axial: number }[]
  /** Indices into `cylinders`, in firing order. */
  firingOrder: number[]
  collectors: { id: string; cylinders: number[] }[]
  gas: Gas
  crankcasePressure: number // Pa, absolute
  crankMass?: number // kg
  inertia: { flywheel: number; freeEnd: number } // kg m²
  /** About which couples are taken, m. */
  referenceAxial: number
}

export interface ThrowPin {
  id: string
  angle: number
  axial: number
  /** Half the stroke, m. */
  radius: number
  /** mass × radius of pin and webs, kg m, at the throw's own angle and place. */
  unbalance: number
}

export interface Cylinder {
  id: string
  bank: number // index
  throw: number // index; a link rod's is its master's
  axial: number
  bore: number
  rodLength: number
  offset: number
  compressionRatio: number
  /** Piston, pin, rings and locks together, kg. */
  pistonMass: number
  rod: { mass: number; cgFromBigEnd: number; inertia: number; rigid: boolean } // inertia about its own c.g., kg m²; rigid when the document gave it
  bigEndBearing: number // kg
  oilAllowance: number // kg, bob-weight card only
  link?: { master: number; knuckleRadius: number; knuckleAngle: number }
  /** Stated choice of turn, rad in 0…cycle. */
  firesAt?: number
}

export interface BalanceShaft {
  id: string
  speedRatio: -2 | -1 | 1 | 2
  angle: number
  unbalance: number // kg m
  axial: number
  horizontal: number
  vertical: number
}

export type Gas =
  | { model: 'none' }
  | { model: 'trace'; angle: Float64Array; pressure: Float64Array } // rad from firing TDC, Pa
  | {
      model: 'heat-release'
      intakePressure: number
      exhaustPressure: number
      gamma: number
      heatPerCycle: number
      combustionStart: number
      combustionDuration: number
      wiebeA: number
      wiebeM: number
      intakeCloses: number
      exhaustOpens: number
      blowdown: number
    }
