'use client'

import { BehindFigure } from '@/components/figures/behind'
import { TypedField } from '@/components/figures/typed-field'
import { useTyped } from '@/components/figures/use-typed'
import { flywheelInertia, speedFluctuation, speedRange } from '@/lib/mechanics/loads/flywheel'
import { formatNumber, formatQuantity, quantityText, withUnit } from '@/lib/units/format'
import type { Digits, Scale, System } from '@/lib/units/quantities'
import { fromSi } from '@/lib/units/units'
import { useBench, useResults, useSessionState } from '@/scene/session/react'

interface Props {
  /** Energy fluctuation of the whole engine, J, and its speed, rad/s. */
  energy: number
  speed: number
}

const three = { significant: 3 } as const

/** Flywheels are told in one unit, however light. */
const inertiaScale = (system: System): Scale => ({
  unit: system === 'us' ? 'lb ft²' : 'kg m²',
  digits: three,
})

const inertiaFigure = (value: number, system: System, digits: Digits = three) =>
  formatQuantity(value, 'inertia', system, digits, inertiaScale(system))

function inertiaText(value: number, system: System, digits?: Digits): string {
  const { text, unit } = inertiaFigure(value, system, digits)
  return withUnit(text, unit)
}

/** A flywheel for a wanted speed fluctuation, and the fluctuation with a given one. */
export function Flywheel({ energy, speed }: Props) {
  const { train } = useResults()
  const { session } = useBench()
  const system = useSessionState((state) => state.system)
  const { flywheel, freeEnd } = train.inertia
  const entered = flywheel + freeEnd
  const wanted = useTyped('share', '%', 0.01, judgeShare)
  const given = useTyped('inertia', inertiaScale(system).unit, entered || undefined, (value) =>
    judgeInertia(value, system),
  )
  const needed = flywheelInertia(energy, wanted.value!, speed)
  const neededFlywheel = roundedUp(needed - freeEnd)
  const run = given.value === undefined ? null : speedRange(energy, given.value, speed)
  const varies =
    given.value === undefined
      ? ''
      : quantityText(speedFluctuation(energy, given.value, speed), 'share', system, { significant: 3 })
  const rpm = (value: number) => formatNumber(fromSi(value, 'rpm'), { decimals: 0 })
  return (
    <div className="loads-flywheel">
      <h4>Flywheel</h4>
      <TypedField
        label="Speed may vary by"
        typed={wanted}
        shown={formatQuantity(wanted.value!, 'share', system, { decimals: 2 })}
      />
      <p className="say" aria-live="polite">
        It takes{' '}
        <BehindFigure
          behind={{ figure: 'flywheel', fluctuation: wanted.value }}
          label={`Flywheel inertia, ${inertiaText(needed, system)}`}
        >
          {inertiaText(needed, system)}
        </BehindFigure>{' '}
        in all, flywheel and free end together.{' '}
        {entered > 0
          ? needed > entered
            ? `That is ${inertiaText(needed - entered, system)} more than the sheet has.`
            : `The sheet has ${inertiaText(entered, system)}: enough.`
          : 'The sheet has none yet.'}
      </p>
      {neededFlywheel > 0 ? (
        <button
          type="button"
          className="btn sm"
          onClick={() =>
            session.edit([{ path: ['train', 'inertia', 'flywheelKgM2'], value: neededFlywheel }])
          }
        >
          Take {inertiaText(neededFlywheel, system, { significant: 4 })} as the flywheel
        </button>
      ) : null}
      <TypedField
        label="Flywheel and free end together"
        typed={given}
        shown={
          given.value === undefined
            ? { text: '', unit: inertiaScale(system).unit }
            : inertiaFigure(given.value, system)
        }
      />
      <p className="say" aria-live="polite">
        {run && given.value !== undefined ? (
          <>
            The speed varies by{' '}
            <BehindFigure
              behind={{ figure: 'speed-fluctuation', inertiaKgM2: given.value }}
              label={`Speed fluctuation, ${varies}`}
            >
              {varies}
            </BehindFigure>
            : from {rpm(run.least)} to {rpm(run.most)} rpm.
          </>
        ) : (
          'Type an inertia to see how far the speed varies with it.'
        )}
      </p>
      <p className="cap">
        Energy to and fro ÷ (share × speed²), the turning-moment diagram’s way. Crank, rods and what is driven
        are not in the inertia.
      </p>
    </div>
  )
}

/** To four figures and never less than asked for: what is taken must be enough. */
function roundedUp(value: number): number {
  if (value <= 0) return 0
  const step = 10 ** (Math.floor(Math.log10(value)) - 3)
  return Number((Math.ceil(value / step) * step).toPrecision(4))
}

const judgeShare = (value: number) =>
  value > 0 && value <= 1
    ? null
    : `Read as ${withUnit(formatNumber(100 * value, { significant: 4 }), '%')}. The speed varies by more than 0 % of its mean, and by 100 % at most.`

const judgeInertia = (value: number, system: System) =>
  value > 0 && value <= 1e9
    ? null
    : `Read as ${inertiaText(value, system)}. Without an inertia above 0 no speed would hold.`
