import type { BodyOf } from '@/lib/contracts/operation'
import type { torsionalModes as contract, TorsionalModesAnswer } from '@/lib/contracts/torsional-modes'
import { refused } from '@/lib/errors/problem'
import { buildPlan } from '@/lib/mechanics/plan'
import {
  criticalSpeeds,
  modeVectorSum,
  runningRange,
  usualOrders,
} from '@/lib/mechanics/torsion/critical-speeds'
import { shaftModes } from '@/lib/mechanics/torsion/shaft-modes'
import { fromSi, toSi } from '@/lib/units/units'
import { stiffnessesOf, torsionChain, type TorsionChain } from '@/scene/frame/torsion-chain'
import { missingWords, torsionAssumptions } from '@/scene/frame/torsion-words'
import type { Issue } from '@/scene/model/issue'
import { arrivingTrain } from './arriving-train'

type Asked = BodyOf<typeof contract>

/** Torsional frequencies, shapes and critical speeds of a train, for anybody who asks. */
export function tellTorsionalModes(asked: Asked): TorsionalModesAnswer {
  const { document, train } = arrivingTrain(asked.train)
  const chain = torsionChain(document, train)
  const issues = issuesOf(asked, chain)
  if (issues.length > 0) throw refused(issues)
  const shear = toSi(asked.shearModulusGPa, 'GPa')
  const inertias = asked.inertias ?? chain.stations.map(({ inertia }) => inertia!)
  const stiffnesses = asked.stiffnesses ?? stiffnessesOf(chain.twists!, shear)
  const modes = shaftModes({ inertias, stiffnesses })
  const range = runningRange(train)
  const { fires } = buildPlan(train, 0)
  const criticals = criticalSpeeds(
    modes.map(({ frequency }) => frequency),
    asked.orders ?? usualOrders(train),
    range,
  )
  return {
    stations: chain.stations.map(({ name }) => name),
    inertias,
    stiffnesses,
    modes: modes.map(({ frequency, shape }) => ({ frequencyHz: frequency / (2 * Math.PI), shape })),
    runningRpm: range && { from: fromSi(range.from, 'rpm'), to: fromSi(range.to, 'rpm') },
    criticals: criticals.map(({ order, mode, speed, place }) => ({
      order,
      mode: mode + 1,
      rpm: fromSi(speed, 'rpm'),
      inRange: place && place !== 'outside',
      vectorSum: modeVectorSum(fires, order, modes[mode], chain.stationOf),
    })),
    assumptions: torsionAssumptions(chain, {
      stiffnesses: asked.stiffnesses ? 'given' : { shear },
      inertias: asked.inertias ? 'given' : 'document',
    }),
  }
}

function issuesOf({ inertias, stiffnesses }: Asked, { stations, missing }: TorsionChain): Issue[] {
  const lacking = [...(inertias ? [] : missing.inertias), ...(stiffnesses ? [] : missing.sizes)]
  return [
    ...lacking.map((path) => ({
      path: `train.${path}`,
      code: 'missing',
      message: `Missing: ${missingWords(path)}.`,
      fix: path.startsWith('inertia')
        ? 'Give it above 0, or all inertias beside the train.'
        : 'Give it, or all stiffnesses beside the train.',
    })),
    ...wrongCount('inertias', inertias, stations.length),
    ...wrongCount('stiffnesses', stiffnesses, stations.length - 1),
  ]
}

function wrongCount(path: string, given: number[] | undefined, wanted: number): Issue[] {
  if (!given || given.length === wanted) return []
  return [
    {
      path,
      code: 'wrong-count',
      message: `${given.length} ${path} given; free end, ${wanted - (path === 'inertias' ? 2 : 1)} throws and flywheel take ${wanted}.`,
      fix: `Give ${wanted}.`,
    },
  ]
}
