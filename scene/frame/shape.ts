import type { Train } from '@/lib/mechanics/train'
import type { CrankTrain } from '@/scene/model/crank-train'

/** Sizes of the drawn parts that the train does not know, in metres. */
export interface Shape {
  pinRadius: number
  /** Radius of the bore through it; 0 where it is solid. */
  pinBore: number
  pinLength: number
  mainRadius: number
  mainBore: number
  mainLength: number
  webThickness: number
  webWidth: number
  counterweightRadius: number
  compressionHeight: number
  skirtBelowPin: number
  builtUp: boolean
}

/** Steel, kg/m³ (common practice). */
export const STEEL = 7850

/** A bore wider than this share of its pin is drawn so wide: a wall must be left to draw. */
const thinnestWall = 0.95

/** The document's sizes; what it leaves out follows the bore and the room along the crank (common practice). */
export function readShape(document: CrankTrain, train: Train): Shape {
  const given = document.shape ?? {}
  const bore = Math.max(...train.cylinders.map((cylinder) => cylinder.bore))
  const radius = Math.max(...train.throws.map((pin) => pin.radius))
  const metres = (mm: number | undefined, otherwise: number) => (mm === undefined ? otherwise : mm / 1000)
  const room = roomBesideThrow(train) ?? 0.58 * bore
  const shared = train.cylinders.length > train.throws.length
  const pinRadius = metres(given.pinDiaMm, 0.56 * bore) / 2
  const mainRadius = metres(given.mainDiaMm, 0.66 * bore) / 2
  return {
    pinRadius,
    pinBore: Math.min(metres(given.pinBoreMm, 0) / 2, thinnestWall * pinRadius),
    pinLength: metres(given.pinLengthMm, (shared ? 0.84 : 0.5) * room),
    mainRadius,
    mainBore: Math.min(metres(given.mainBoreMm, 0) / 2, thinnestWall * mainRadius),
    mainLength: metres(given.mainLengthMm, (shared ? 0.42 : 0.5) * room),
    webThickness: metres(given.webThicknessMm, (shared ? 0.37 : 0.5) * room),
    webWidth: metres(given.webWidthMm, bore),
    counterweightRadius: metres(
      given.counterweightRadiusMm || undefined,
      Math.max(0.94 * bore, radius + pinRadius),
    ),
    compressionHeight: metres(given.compressionHeightMm, 0.33 * bore),
    skirtBelowPin: metres(given.skirtBelowPinMm, 0.22 * bore),
    builtUp: given.builtUp ?? false,
  }
}

/** Least distance of a main from a throw beside it. */
function roomBesideThrow({ throws, mains }: Train): number | undefined {
  const distances = throws.flatMap((pin) => mains.map((main) => Math.abs(main.axial - pin.axial)))
  const least = Math.min(...distances.filter((distance) => distance > 0))
  return Number.isFinite(least) ? least : undefined
}
