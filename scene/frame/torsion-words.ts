import type { Caution } from '@/lib/mechanics/analysis/cautions'
import { formatNumber } from '@/lib/units/format'
import { STEEL } from './shape'
import type { TorsionChain } from './torsion-chain'

/** Where the figures of a chain come from. */
export interface ChainSource {
  /** Shear modulus where the stiffnesses follow from it, Pa; else one figure a throw, or each given. */
  stiffnesses: { shear: number } | 'by-throw' | 'given'
  inertias: 'document' | 'given'
}

/** What a torsional model of a crank takes for granted, beginning with its limits. */
export function torsionAssumptions(
  { missing, kerWilson }: Pick<TorsionChain, 'missing' | 'kerWilson'>,
  { stiffnesses, inertias }: ChainSource,
): Caution[] {
  const said: Caution[] = [
    {
      code: 'lumped',
      message:
        'Lumped inertias on springs without mass, undamped: frequencies and shapes, no amplitudes and no stresses. No gear, clutch, belt or driven machine is in it, and no damper but what stands in the inertia of the free end.',
    },
  ]
  if (inertias === 'given')
    said.push({ code: 'given-inertias', message: 'All inertias were given, none follows from the document.' })
  else {
    said.push({
      code: 'throw-inertia',
      message:
        'A throw turns with its own metal, all that rotates on its pin and half of what goes to and fro, at the radius of the throw.',
    })
    said.push(
      missing.sizes.length > 0
        ? {
            code: 'no-crank-bodies',
            message:
              'Sizes of the crank are missing, so its pins, webs, journals and counterweights count as nothing: the true frequencies are lower.',
          }
        : {
            code: 'crank-bodies',
            message: `Pins, webs and journals are plain bodies of steel, ${formatNumber(STEEL, { decimals: 0 })} kg/m³, in the outline drawn; a counterweight is a point mass on top of its web (common practice).`,
          },
    )
  }
  said.push(...stiffnessWords(stiffnesses, kerWilson))
  if (stiffnesses !== 'given')
    said.push({
      code: 'ends',
      message:
        stiffnesses === 'by-throw'
          ? 'Half a throw lies between an end of the crank and the throw beside it; nose and flange are not sprung.'
          : 'Free end and flywheel sit at the outer faces of the outermost journals; nose and flange are not sprung.',
    })
  return said
}

function stiffnessWords(stiffnesses: ChainSource['stiffnesses'], kerWilson: number | null): Caution[] {
  if (stiffnesses === 'given')
    return [{ code: 'given-stiffnesses', message: 'All stiffnesses were given, none follows from sizes.' }]
  if (stiffnesses === 'by-throw')
    return [{ code: 'given-stiffness', message: 'The stiffness of a throw was given, the same for all.' }]
  const { shear } = stiffnesses
  const beside =
    kerWilson === null
      ? 'Ker Wilson’s does not hold for this overlap.'
      : `Ker Wilson’s, from memory too, makes the first throw ${formatNumber(100 * Math.abs(kerWilson), { decimals: 0 })} % ${kerWilson < 0 ? 'softer' : 'stiffer'}.`
  return [
    {
      code: 'stiffness-from-memory',
      message: `Stiffness by Carter’s equivalent length, from memory and not checked against print, with a shear modulus of ${formatNumber(shear / 1e9, { decimals: 1 })} GPa. ${beside} A measured stiffness goes before either.`,
    },
  ]
}

const names: Record<string, string> = {
  'inertia.freeEndKgM2': 'the inertia of the free end',
  'inertia.flywheelKgM2': 'the inertia of the flywheel',
  'shape.mainDiaMm': 'the diameter of the mains',
  'shape.mainLengthMm': 'the length of the mains',
  'shape.pinDiaMm': 'the diameter of the pins',
  'shape.pinLengthMm': 'the length of the pins',
  'shape.webThicknessMm': 'the thickness of the webs',
  'shape.webWidthMm': 'the width of the webs',
}

/** A missing figure of the document by its path, in words. */
export const missingWords = (path: string): string => names[path] ?? path
