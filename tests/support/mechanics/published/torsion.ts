import { holzer } from '@/lib/mechanics/torsion/holzer'
import { nodesOf, shaftModes, type ShaftChain } from '@/lib/mechanics/torsion/shaft-modes'
import { equivalentLength, shaftStiffness } from '@/lib/mechanics/torsion/shaft-stiffness'
import { inputs, type Case } from './entry'
import { FOOT, INCH, POUND } from './rig'

const TURN = 2 * Math.PI
const LONG_TON = 2240 * POUND

/** Frequencies (Hz) and shapes with 1 at the first inertia, as the books print them. */
function chain(of: ShaftChain) {
  const modes = shaftModes(of)
  return {
    speeds: modes.map(({ frequency }) => frequency),
    hertz: modes.map(({ frequency }) => frequency / TURN),
    shapes: modes.map(({ shape }) => shape.map((angle) => angle / shape[0])),
  }
}

/** One diameter from inertia to inertia. */
const even = (diameter: number, lengths: number[], shear: number) =>
  lengths.map((length) => shaftStiffness([{ length, outer: diameter }], shear))

export const torsion: Record<string, Case> = {
  'TOR-01': {
    figures: (i) => {
      const it =
        inputs<Record<'shaftLengths_in' | 'shaftDiameters_in' | 'inertias_lb_ft2', number[]>>('TOR-01')
      const lengths = it.shaftLengths_in.map((length, k) => ({
        length: length * INCH,
        outer: it.shaftDiameters_in[k] * INCH,
      }))
      // the book's own 32.2 ft/s² between pound and pound-force
      const poundForce = POUND * i.gravity_ft_s2 * FOOT
      const stiffness = shaftStiffness(lengths, (i.shearModulus_lbf_in2 * poundForce) / INCH ** 2)
      const inertias = it.inertias_lb_ft2.map((inertia) => inertia * POUND * FOOT ** 2)
      return {
        naturalFrequency_Hz: chain({ inertias, stiffnesses: [stiffness] }).hertz[0],
        equivalentLength_in: equivalentLength(lengths, lengths[0].outer) / INCH,
        stiffness_lbf_in_per_rad: stiffness / (poundForce * INCH),
      }
    },
  },
  'TOR-02': {
    figures: (i) => {
      const it = inputs<Record<'inertias_ton_ft2' | 'lengths_ft', number[]>>('TOR-02')
      const shear = (i.shearModulus_lbf_in2 * POUND * i.gravity_ft_s2 * FOOT) / INCH ** 2
      const { hertz, shapes } = chain({
        inertias: it.inertias_ton_ft2.map((inertia) => inertia * LONG_TON * FOOT ** 2),
        stiffnesses: even(
          i.shaftDiameter_in * INCH,
          it.lengths_ft.map((length) => length * FOOT),
          shear,
        ),
      })
      return {
        oneNodeFrequency_per_min: 60 * hertz[0],
        twoNodeFrequency_per_min: 60 * hertz[1],
        mode1: shapes[0],
        mode2: shapes[1],
      }
    },
  },
  'TOR-04': {
    figures: (i) => {
      const { lengthsToFixedEnds_m } = inputs<{ lengthsToFixedEnds_m: number[] }>('TOR-04')
      const inertia = i.flywheelMass_kg * i.gyration_m ** 2
      const { hertz } = chain({
        // an end that is held: an inertia that nothing turns
        inertias: [1e8 * inertia, inertia, 1e8 * inertia],
        stiffnesses: even(i.shaftDiameter_mm / 1000, lengthsToFixedEnds_m, i.shearModulus_GPa * 1e9),
      })
      return { torsionalFrequency_Hz: hertz[1] }
    },
  },
  'TOR-05': {
    figures: (i) => {
      // the pump's side as the motor's shaft feels it: inertia and stiffness by the square of the speeds
      const square = (i.pumpSpeed_rpm / i.motorSpeed_rpm) ** 2
      const stiffness = (shaft: 1 | 2) =>
        shaftStiffness(
          [{ length: i[`shaft${shaft}_length_mm`] / 1000, outer: i[`shaft${shaft}_diameter_mm`] / 1000 }],
          i.shearModulus_GPa * 1e9,
        )
      const series = 1 / (1 / stiffness(1) + 1 / (stiffness(2) * square))
      const { hertz } = chain({
        inertias: [i.motorInertia_kg_m2, i.pumpInertia_kg_m2 * square],
        stiffnesses: [series],
      })
      return { naturalFrequency_Hz: hertz[0] }
    },
  },
  'TOR-06': {
    figures: (i) => {
      const it = inputs<Record<'inertias_kg_m2' | 'lengths_m', number[]>>('TOR-06')
      const { hertz, shapes } = chain({
        inertias: it.inertias_kg_m2,
        stiffnesses: even(i.shaftDiameter_mm / 1000, it.lengths_m, i.shearModulus_GPa * 1e9),
      })
      return {
        oneNodeFrequency_Hz: hertz[0],
        twoNodeFrequency_Hz: hertz[1],
        mode1: shapes[0],
        mode2: shapes[1],
      }
    },
  },
  'TOR-09': {
    figures: () => {
      const it = given('TOR-09')
      const { hertz, shapes } = chain(it)
      const found = hertz.findIndex((frequency) => frequency * 60 > 8000 && frequency * 60 < 8500)
      return {
        naturalFrequencyBetween8000And8500_per_min: 60 * hertz[found],
        nodesOfThatMode: nodesOf(shapes[found]),
        allFrequencies_per_min: [0, ...hertz.map((frequency) => 60 * frequency)],
        mode: shapes[found],
      }
    },
    without: {
      holzerResidualTorque: 'rounding of a sum that is nothing: another arithmetic, another rounding',
    },
  },
  'TOR-10': {
    figures: (i) => ({
      naturalFrequencies_rad_s: [
        0,
        ...chain({
          inertias: new Array<number>(i.discs).fill(i.inertia_kg_m2),
          stiffnesses: new Array<number>(i.discs - 1).fill(i.stiffness_Nm_per_rad),
        }).speeds,
      ],
    }),
  },
  'TOR-12': {
    figures: () => {
      const it = given('TOR-12')
      const { speeds, shapes } = chain(it)
      const { amplitudes, torques } = holzer(it, speeds[0])
      return {
        naturalFrequencies_rad_s: [0, ...speeds],
        mode1: shapes[0],
        mode2: shapes[1],
        holzerAmplitudes: amplitudes,
        holzerInertiaTorques_Nm: torques,
      }
    },
  },
}

function given(id: string): ShaftChain {
  const it = inputs<Record<'inertias_kg_m2' | 'stiffnesses_Nm_per_rad', number[]>>(id)
  return { inertias: it.inertias_kg_m2, stiffnesses: it.stiffnesses_Nm_per_rad }
}
