import { turningOrders } from '@/lib/mechanics/balance/turning'
import { balanceVerdict, type Remedy, type VerdictPart } from '@/lib/mechanics/balance/verdict'
import { quantityText } from '@/lib/units/format'
import type { System } from '@/lib/units/quantities'
import { toSi } from '@/lib/units/units'
import type { Results } from '@/scene/session/results'

/** In one sentence: what counterweights take, what needs a shaft against the crank, what needs shafts at twice its speed. */
export function verdictSentence({ train, speedRpm, bareOrders, analysis }: Results, system: System): string {
  if (speedRpm === 0) return 'Standing still: no inertia forces.'
  const speed = toSi(speedRpm, 'rpm')
  const parts = balanceVerdict(train, turningOrders(bareOrders), turningOrders(analysis.orders), speed)
  if (parts.length === 0)
    return 'Nothing worth naming shakes in the first or second order: balance asks for no counterweight and no shaft.'
  const clauses = remedies.flatMap((remedy) => clause(remedy, parts, system))
  if (parts.every(({ remedy }) => remedy === 'counterweights')) clauses.push('it takes no balance shaft')
  if (!parts.some(({ remedy }) => remedy === 'counterweights'))
    clauses.unshift('counterweights have nothing to take from the crank as a whole')
  const sentence = clauses.join('; ')
  return `${sentence[0].toUpperCase()}${sentence.slice(1)}.`
}

const remedies: Remedy[] = ['counterweights', 'counter-turning shaft', 'shafts at twice the speed']

const words: Record<Remedy, { what: string; needs: string; takes: string }> = {
  counterweights: {
    what: 'that turns forward',
    needs: 'is left for counterweights to take',
    takes: 'is taken by counterweights',
  },
  'counter-turning shaft': {
    what: 'that turns backward',
    needs: 'needs a shaft at crank speed against the crank',
    takes: 'is taken by a shaft against the crank',
  },
  'shafts at twice the speed': {
    what: '',
    needs: 'needs shafts at twice the speed',
    takes: 'is taken by shafts at twice the speed',
  },
}

function clause(remedy: Remedy, all: VerdictPart[], system: System): string[] {
  const parts = all.filter((part) => part.remedy === remedy)
  const order = remedy === 'shafts at twice the speed' ? 'second' : 'first'
  return parts.map(({ kind, bare, left }) => {
    const size = (value: number) => quantityText(value, kind === 'force' ? 'force' : 'torque', system)
    const { what, needs, takes } = words[remedy]
    const subject = (value: number) =>
      [
        `a ${order}-order ${kind} of`,
        remedy === 'shafts at twice the speed' ? 'up to' : '',
        size(value),
        what,
      ]
        .filter(Boolean)
        .join(' ')
    if (left === 0) return `${subject(bare)} ${takes}`
    return `${subject(left)} ${needs}`
  })
}
