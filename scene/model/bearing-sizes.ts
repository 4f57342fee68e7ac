import type { BearingSizes } from '@/lib/mechanics/loads/bearings'
import type { CrankTrain } from './crank-train'

/** Diameters and lengths of pins and mains of a document, m, where its shape gives both. */
export function bearingSizes({ shape }: CrankTrain): BearingSizes {
  const size = (diameterMm?: number, lengthMm?: number) =>
    diameterMm === undefined || lengthMm === undefined
      ? undefined
      : { diameter: diameterMm / 1000, length: lengthMm / 1000 }
  return {
    pin: size(shape?.pinDiaMm, shape?.pinLengthMm),
    main: size(shape?.mainDiaMm, shape?.mainLengthMm),
  }
}
