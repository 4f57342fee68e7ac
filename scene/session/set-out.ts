import { crankTrainSchema, type CrankTrain, type CrankTrainInput } from '@/scene/model/crank-train'
import { fitOrder } from './fit-order'

export interface SettingOut {
  title: string
  cycle: CrankTrain['cycle']
  bankAngles: number[]
  throwAngles: number[]
  /** One cylinder from every bank on each throw, one a throw with the banks in turn, or all on one master rod. */
  arrangement: 'every-bank' | 'banks-in-turn' | 'master-rod'
  boreMm: number
  strokeMm: number
  /** Between neighbouring throws; by the bore where not given. */
  pitchMm?: number
  /** How far the second bank's pin stands ahead of the first's where each has its own on a throw. */
  splitDeg?: number
}

/**
 * Proportions of the bore for a train that is only being set out: rod 1.75 strokes, piston 0.45 g and rod 0.75 g per
 * cubic centimetre of bore cubed, journals and webs of a car engine. Common practice, from memory; to be replaced by real ones.
 */
export function setOut(layout: SettingOut): CrankTrain {
  const { boreMm, strokeMm, bankAngles, throwAngles, arrangement, splitDeg = 0 } = layout
  const cube = (boreMm / 10) ** 3 / 1000 // kg at 1 g/cm³ of bore cubed
  const round = (value: number, decimals = 1) => Number(value.toFixed(decimals))
  const perThrow = arrangement === 'banks-in-turn' ? 1 : bankAngles.length
  const side = arrangement === 'master-rod' ? 0 : round(0.23 * boreMm)
  const pitch = layout.pitchMm ?? round(pitchFor(layout))
  const middle = ((throwAngles.length - 1) * pitch) / 2
  const rodLengthMm = round((arrangement === 'master-rod' ? 2.05 : 1.75) * strokeMm)
  const rodKg = 0.75 * cube
  const knuckleRadiusMm = round(0.26 * rodLengthMm)

  const unbalanceKgMm = round(0.0023 * cube * boreMm * strokeMm, 4)
  const bays = throwAngles.map((angleDeg, i) => ({
    id: `${i + 1}`,
    angleDeg,
    axialMm: round(i * pitch - middle),
    unbalanceKgMm,
  }))
  const throws =
    splitDeg === 0
      ? bays
      : bays.flatMap((bay) =>
          [0, 1].map((k) => ({
            id: `${bay.id}${'ab'[k]}`,
            angleDeg: (bay.angleDeg + k * splitDeg + 360) % 360,
            axialMm: round(bay.axialMm + (k - 0.5) * side),
            unbalanceKgMm: unbalanceKgMm / 2,
          })),
        )
  const cylinders = bays.flatMap((pin, t) =>
    Array.from({ length: perThrow }, (_, k) => {
      const bank = arrangement === 'banks-in-turn' ? t % bankAngles.length : k
      const id = `${t * perThrow + k + 1}`
      const place = pin.axialMm + (k - (perThrow - 1) / 2) * side
      const master = `${t * perThrow + 1}`
      const link =
        arrangement === 'master-rod' && k > 0
          ? {
              rodLengthMm: round(rodLengthMm - knuckleRadiusMm),
              rod: {
                massKg: round(0.35 * rodKg, 4),
                cgFromBigEndMm: round(0.45 * (rodLengthMm - knuckleRadiusMm)),
              },
              link: { master, knuckleRadiusMm, knuckleAngleDeg: bankAngles[k] - bankAngles[0] },
            }
          : {}
      const own = splitDeg === 0 ? pin.id : `${pin.id}${'ab'[k]}`
      return { id, bank: letter(bank), throw: own, axialMm: round(place), ...link }
    }),
  )
  const webs = 0.3 * boreMm
  const rotating = perThrow * (rodKg * 0.72 + 0.058 * cube) * (strokeMm / 2) + unbalanceKgMm
  const radiusMm = round(0.56 * boreMm)
  const counterweights = bays.flatMap((pin) =>
    [-1, 1].map((end) => ({
      id: `${pin.id}${end < 0 ? 'F' : 'D'}`,
      axialMm: round(pin.axialMm + end * webs),
      angleDeg: (pin.angleDeg + splitDeg / 2 + 180) % 360,
      massKg: round(rotating / 2 / radiusMm, 4),
      radiusMm,
    })),
  )
  const mains = Array.from({ length: bays.length + 1 }, (_, i) => ({
    id: `M${i + 1}`,
    axialMm: round((i - 0.5) * pitch - middle),
  }))
  const laid: CrankTrainInput = {
    format: 'crank-train/1',
    title: layout.title,
    cycle: layout.cycle,
    operating: speedsFor(strokeMm),
    cylinderDefaults: { boreMm, strokeMm, rodLengthMm, compressionRatio: 10.5 },
    masses: {
      pistonKg: round(0.45 * cube, 4),
      pistonPinKg: round(0.13 * cube, 4),
      ringsKg: round(0.032 * cube, 4),
      locksKg: round(0.003 * cube, 4),
      rod: { massKg: round(rodKg, 4), cgFromBigEndMm: round(0.28 * rodLengthMm) },
      bigEndBearingKg: round(0.058 * cube, 4),
      oilAllowanceKg: 0.004,
    },
    banks: bankAngles.map((angleDeg, i) => ({ id: letter(i), angleDeg })),
    throws,
    cylinders,
    counterweights,
    mains,
    firingOrder: [],
    collectors: bankAngles
      .map((_, i) => ({
        id: letter(i),
        cylinders: cylinders.filter(({ bank }) => bank === letter(i)).map(({ id }) => id),
      }))
      .filter(({ cylinders: members }) => arrangement !== 'master-rod' && members.length > 0),
    gas: {
      model: 'heat-release',
      intakePressureBar: 1,
      exhaustPressureBar: 1.05,
      gamma: 1.32,
      heatPerCycleJ: round((2.6 * ((Math.PI / 4) * boreMm ** 2 * strokeMm)) / 1000, 0),
      combustionStartDeg: -18,
      combustionDurationDeg: 55,
      wiebeM: 2,
      intakeClosesDeg: layout.cycle === 'two-stroke' ? -115 : -140,
      exhaustOpensDeg: layout.cycle === 'two-stroke' ? 110 : 135,
    },
  }
  const document = crankTrainSchema.parse(laid)
  return { ...document, firingOrder: fitOrder(document) }
}

const letter = (index: number) => String.fromCharCode(65 + (index % 26))

/** Bores of one bank need 1.12 of the bore between them; where banks take turns each throw needs its share of that. */
function pitchFor({ boreMm, arrangement, bankAngles }: SettingOut): number {
  if (arrangement === 'banks-in-turn' && bankAngles.length > 1)
    return Math.max(1.2 / bankAngles.length, 0.62) * boreMm
  return (bankAngles.length > 1 ? 1.14 : 1.1) * boreMm
}

/** Rated at 17 m/s of mean piston speed, the most at 20. */
function speedsFor(strokeMm: number) {
  const at = (speed: number) => Math.round((speed * 30) / (strokeMm / 1000) / 100) * 100
  return { idleRpm: Math.max(100, Math.round(at(17) / 800) * 100), ratedRpm: at(17), maxRpm: at(20) }
}
