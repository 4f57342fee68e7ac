import type { Sizes } from '@/lib/mechanics/explain/engine'
import type { CrankTrain } from './crank-train'

const metres = (mm: number | undefined) => (mm === undefined ? undefined : mm / 1000)

/** The sizes of a document that figures need beside the train, in m. */
export function sizesOf({ shape = {} }: CrankTrain): Sizes {
  const sizes: Sizes = {
    pinDia: metres(shape.pinDiaMm),
    pinLength: metres(shape.pinLengthMm),
    mainDia: metres(shape.mainDiaMm),
    mainLength: metres(shape.mainLengthMm),
    webThickness: metres(shape.webThicknessMm),
    counterweightRadius: metres(shape.counterweightRadiusMm),
    skirtBelowPin: metres(shape.skirtBelowPinMm),
    crownAbovePin: metres(shape.compressionHeightMm),
    deckHeight: metres(shape.deckHeightMm),
  }
  return sizes
}
