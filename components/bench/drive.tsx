'use client'

import { useEffect, useId } from 'react'
import { stepClock } from '@/components/drawing/clock-moves'
import { Icon } from '@/components/ui/icon'
import { NumberField } from '@/components/ui/number-field'
import { SliderRule } from '@/components/ui/slider-rule'
import { formatNumber } from '@/lib/units/format'
import { useBench, useSessionState } from '@/scene/session/react'
import { fields } from './fields'
import { RefusedNote } from '@/components/figures/refused-note'
import { useReducedMotion } from '@/components/drawing/use-reduced-motion'
import { usePlaying } from './use-clock'

const SLOWEST = 2000
const slownesses = [1, 2, 5, 10, 20, 50, 100, 200, 500, 1000, 2000]
/** Slow at the left, real time at the right. */
const placeOf = (slowdown: number) => 1 - Math.log(slowdown) / Math.log(SLOWEST)
const slowdownAt = (place: number) => {
  const exact = SLOWEST ** (1 - place)
  const near = slownesses.find((value) => Math.abs(placeOf(value) - place) < 0.02)
  return near ?? Number(exact.toPrecision(2))
}
const long = [1, 10, 100, 1000].map(placeOf)
const short = slownesses.map(placeOf).filter((place) => !long.includes(place))

/** Runs the clock: play, steps, the speed that the forces are for, and how much slower it is shown. */
export function Drive() {
  const { session, clock } = useBench()
  const view = useSessionState((state) => state.scene.view)
  const scene = useSessionState((state) => state.scene)
  const system = useSessionState((state) => state.system)
  const refusal = useSessionState((state) => state.refused[fields.speed.key])
  const playing = usePlaying()
  const still = useReducedMotion()
  const id = useId()
  const { speedRpm, slowdown, reverse } = view
  const shownRpm = speedRpm / slowdown

  useEffect(() => {
    clock.setRate((shownRpm * 2 * Math.PI) / 60)
    clock.setReverse(reverse)
  }, [clock, shownRpm, reverse])
  useEffect(() => {
    if (!still) return
    clock.pause()
    clock.setAngle(0)
  }, [clock, still])

  const setSlowdown = (value: number) =>
    session.edit([{ path: ['view', 'slowdown'], value: Math.min(SLOWEST, Math.max(1, value)) }])
  const step = (by: number) => {
    const at = slownesses.findIndex((value) => value >= slowdown)
    const next = Math.min(slownesses.length - 1, Math.max(0, (at < 0 ? 0 : at) - by))
    setSlowdown(slownesses[next])
  }
  const stepButton = (by: number, icon: 'back' | 'on', small: boolean) => (
    <button
      type="button"
      className={small ? 'btn sm' : 'btn ic'}
      aria-label={`${by < 0 ? 'Back' : 'On'} ${Math.abs(by)} ${Math.abs(by) === 1 ? 'degree' : 'degrees'}`}
      onClick={() => stepClock(clock, by)}
    >
      {small && by > 0 ? '0.1°' : null}
      <Icon name={icon} />
      {small && by < 0 ? '0.1°' : null}
    </button>
  )
  return (
    <div className="drive">
      <div className="btns">
        {still ? null : (
          <button
            type="button"
            className="btn pri ic"
            aria-label={playing ? 'Pause' : 'Play'}
            onClick={() => (playing ? clock.pause() : clock.play())}
          >
            <Icon name={playing ? 'pause' : 'play'} />
          </button>
        )}
        {stepButton(-1, 'back', false)}
        {stepButton(1, 'on', false)}
      </div>
      <div className="lf speed">
        <label htmlFor={id}>Engine speed</label>
        <NumberField
          id={id}
          look="box"
          text={fields.speed.show(scene, system).text}
          unit="rpm"
          refused={refusal?.text}
          describedBy={refusal ? `${id}-note` : undefined}
          onText={(text) => session.enter(fields.speed, text)}
          onDone={session.seal}
          onEscape={() => session.drop(fields.speed.key)}
        />
        {refusal ? (
          <div className="speed-note">
            <RefusedNote
              id={`${id}-note`}
              refusal={refusal}
              field={fields.speed}
              stands={`${formatNumber(speedRpm, { decimals: 0 })} rpm`}
            />
          </div>
        ) : null}
      </div>
      <div className="lf shown">
        <span className="lab">
          Shown at 1 : {formatNumber(slowdown, { decimals: 0 })},{' '}
          {formatNumber(shownRpm, { decimals: shownRpm < 10 ? 1 : 0 })} rpm
        </span>
        <SliderRule
          label="Shown speed"
          at={placeOf(slowdown)}
          value={slowdown}
          min={1}
          max={SLOWEST}
          valueText={`1 to ${slowdown}, ${formatNumber(shownRpm, { decimals: 1 })} revolutions a minute`}
          long={long}
          short={short}
          onMove={(place) => setSlowdown(slowdownAt(place))}
          onStep={step}
        />
      </div>
      <div className="btns fine">
        {stepButton(-0.1, 'back', true)}
        {stepButton(0.1, 'on', true)}
        <button
          type="button"
          className="btn sm"
          aria-label="Reverse"
          aria-pressed={reverse}
          onClick={() => session.edit([{ path: ['view', 'reverse'], value: !reverse }])}
        >
          <Icon name="reverse" />
        </button>
      </div>
    </div>
  )
}
