import { plainField } from './plain-field'
import { slip, usual } from './usual'

const doubt = slip(usual.pressure, 'bar', ['kPa', 'psi', 'MPa'], { below: 4, above: 3 })

/** The figures of the heat-release model, wherever they are entered. */
export const heatReleaseFields = {
  intake: plainField(['gas', 'intakePressureBar'], 'Intake pressure', 'pressure', 'bar', { doubt }),
  exhaust: plainField(['gas', 'exhaustPressureBar'], 'Exhaust pressure', 'pressure', 'bar', { doubt }),
  gamma: plainField(['gas', 'gamma'], 'Ratio of specific heats', 'ratio', ''),
  heat: plainField(['gas', 'heatPerCycleJ'], 'Heat a cycle', 'energy', 'J'),
  burnStart: plainField(['gas', 'combustionStartDeg'], 'Burning starts', 'angle', '°'),
  burnFor: plainField(['gas', 'combustionDurationDeg'], 'Burns for', 'angle', '°'),
  wiebeA: plainField(['gas', 'wiebeA'], 'Wiebe a', 'ratio', ''),
  wiebeM: plainField(['gas', 'wiebeM'], 'Wiebe m', 'ratio', ''),
  intakeCloses: plainField(['gas', 'intakeClosesDeg'], 'Intake closes', 'angle', '°'),
  exhaustOpens: plainField(['gas', 'exhaustOpensDeg'], 'Exhaust opens', 'angle', '°'),
  blowdown: plainField(['gas', 'blowdownDeg'], 'Blowdown falls over', 'angle', '°'),
}

export const crankcaseField = plainField(['crankcasePressureBar'], 'Crankcase pressure', 'pressure', 'bar', {
  doubt,
})
