import type { Plan } from '../instant'

export interface TrainSummary {
  title: string
  cylinderCount: number
  /** Bore area × true travel, all cylinders. */
  displacementCc: number
  /** Of the cylinder with the longest travel: twice its true travel a turn. */
  meanPistonSpeedMS: number
}

export function trainSummary({ train, speed, centres, chambers }: Plan): TrainSummary {
  const travel = centres.map(({ topHeight, bottomHeight }) => topHeight - bottomHeight)
  return {
    title: train.title,
    cylinderCount: train.cylinders.length,
    displacementCc: 1e6 * chambers.reduce((sum, { area }, index) => sum + area * travel[index], 0),
    meanPistonSpeedMS: (Math.max(...travel) * speed) / Math.PI,
  }
}
