import { units, type UnitName } from '@/lib/units/units'
import type { Cylinder, Gas, Train } from '@/lib/mechanics/train'
import type { CrankTrain } from './crank-train'
import { cylinderValues } from './cylinder-values'

const si = (value: number, unit: UnitName) => value * units[unit].factor
const mm = (value: number) => value / 1000
const rad = (value: number) => si(value, '°')
const optional = (value: number | undefined, unit: UnitName) =>
  value === undefined ? undefined : si(value, unit)

const indexOf = (list: readonly { id: string }[]) => {
  const places = new Map(list.map(({ id }, index) => [id, index]))
  return (id: string) => places.get(id) ?? -1
}

/**
 * A crank-train document as the kernel takes it: SI and radians, defaults merged, references resolved.
 * The document must have passed `readTrain`; an unknown reference would become index −1.
 */
export function toTrain(document: CrankTrain): Train {
  const bank = indexOf(document.banks)
  const throwPin = indexOf(document.throws)
  const cylinder = indexOf(document.cylinders)
  const places = document.cylinders.map(({ axialMm }) => axialMm)
  const operating = document.operating ?? {}

  const cylinders = document.cylinders.map((entry): Cylinder => {
    const values = cylinderValues(document, entry)
    const { rod, link } = values
    const [length, cg] = [mm(values.rodLengthMm), mm(rod.cgFromBigEndMm)]
    return {
      id: entry.id,
      bank: bank(entry.bank),
      throw: throwPin(entry.throw),
      axial: mm(entry.axialMm),
      bore: mm(values.boreMm),
      rodLength: length,
      offset: mm(values.offsetMm),
      compressionRatio: values.compressionRatio,
      pistonMass: values.pistonKg + values.pistonPinKg + values.ringsKg + values.locksKg,
      rod: {
        mass: rod.massKg,
        cgFromBigEnd: cg,
        inertia:
          rod.inertiaKgMm2 === undefined ? rod.massKg * cg * (length - cg) : si(rod.inertiaKgMm2, 'kg mm²'),
        rigid: rod.inertiaKgMm2 !== undefined,
      },
      bigEndBearing: values.bigEndBearingKg,
      oilAllowance: values.oilAllowanceKg,
      link: link && {
        master: cylinder(link.master),
        knuckleRadius: mm(link.knuckleRadiusMm),
        knuckleAngle: rad(link.knuckleAngleDeg),
      },
      firesAt: optional(entry.firesAtDeg, '°'),
    }
  })

  return {
    title: document.title,
    cycle: (document.cycle === 'four-stroke' ? 4 : 2) * Math.PI,
    rotation: document.rotation,
    operating: {
      idle: optional(operating.idleRpm, 'rpm'),
      rated: optional(operating.ratedRpm, 'rpm'),
      max: optional(operating.maxRpm, 'rpm'),
    },
    balanceFactor: document.balanceFactor,
    banks: document.banks.map(({ id, angleDeg }) => ({ id, angle: rad(angleDeg) })),
    throws: document.throws.map((pin, index) => ({
      id: pin.id,
      angle: rad(pin.angleDeg),
      axial: mm(pin.axialMm),
      radius: mm(strokeOnThrow(document, index)) / 2,
      unbalance: si(pin.unbalanceKgMm, 'kg mm'),
    })),
    cylinders,
    counterweights: document.counterweights.map((weight) => ({
      id: weight.id,
      axial: mm(weight.axialMm),
      angle: rad(weight.angleDeg),
      mass: weight.massKg,
      radius: mm(weight.radiusMm),
    })),
    balanceShafts: document.balanceShafts.map((shaft) => ({
      id: shaft.id,
      speedRatio: shaft.speedRatio,
      angle: rad(shaft.angleDeg),
      unbalance: si(shaft.unbalanceKgMm, 'kg mm'),
      axial: mm(shaft.axialMm),
      horizontal: mm(shaft.horizontalMm),
      vertical: mm(shaft.verticalMm),
    })),
    mains: document.mains
      .map(({ id, axialMm }) => ({ id, axial: mm(axialMm) }))
      .sort((one, other) => one.axial - other.axial),
    firingOrder: document.firingOrder.map(cylinder),
    collectors: document.collectors.map(({ id, cylinders: members }) => ({
      id,
      cylinders: members.map(cylinder),
    })),
    gas: gasInSi(document.gas),
    crankcasePressure: si(document.crankcasePressureBar, 'bar'),
    crankMass: document.crankMassKg,
    inertia: {
      flywheel: document.inertia?.flywheelKgM2 ?? 0,
      freeEnd: document.inertia?.freeEndKgM2 ?? 0,
    },
    referenceAxial: mm(document.referenceAxialMm ?? (Math.min(...places) + Math.max(...places)) / 2),
  }
}

/** The stroke of the cylinders on a throw; a throw that carries none is drawn at the common stroke. */
function strokeOnThrow(document: CrankTrain, index: number): number {
  const on = document.cylinders.find((entry) => entry.throw === document.throws[index].id)
  return cylinderValues(document, on ?? document.cylinders[0]).strokeMm
}

function gasInSi(gas: CrankTrain['gas']): Gas {
  switch (gas.model) {
    case 'none':
      return { model: 'none' }
    case 'trace':
      return {
        model: 'trace',
        angle: Float64Array.from(gas.angleDeg, rad),
        pressure: Float64Array.from(gas.pressureBar, (pressure) => si(pressure, 'bar')),
      }
    case 'heat-release':
      return {
        model: 'heat-release',
        intakePressure: si(gas.intakePressureBar, 'bar'),
        exhaustPressure: si(gas.exhaustPressureBar, 'bar'),
        gamma: gas.gamma,
        heatPerCycle: gas.heatPerCycleJ,
        combustionStart: rad(gas.combustionStartDeg),
        combustionDuration: rad(gas.combustionDurationDeg),
        wiebeA: gas.wiebeA,
        wiebeM: gas.wiebeM,
        intakeCloses: rad(gas.intakeClosesDeg),
        exhaustOpens: rad(gas.exhaustOpensDeg),
        blowdown: rad(gas.blowdownDeg),
      }
  }
}
