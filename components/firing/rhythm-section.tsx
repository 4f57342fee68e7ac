'use client'

import { useEffect, useId, useMemo, useRef, useState } from 'react'
import { LeafSection } from '@/components/figures/leaf'
import { NumberField } from '@/components/ui/number-field'
import { FieldNote } from '@/components/ui/field-note'
import { Segmented } from '@/components/ui/segmented'
import { SliderRule } from '@/components/ui/slider-rule'
import { Switch } from '@/components/ui/switch'
import { exhaustPulses, type PulseWindow } from '@/lib/mechanics/exhaust-pulses'
import type { Train } from '@/lib/mechanics/train'
import { formatNumber } from '@/lib/units/format'
import { parseQuantity } from '@/lib/units/parse'
import { fromSi, toSi } from '@/lib/units/units'
import { useBench } from '@/scene/session/react'
import { RhythmMarks, type MarksHandle } from './rhythm-marks'
import { beatsOf } from './rhythm'
import { useRhythm, type Pace } from './use-rhythm'

interface Props {
  train: Train
  window: PulseWindow
  groups?: readonly (readonly number[])[]
}

const MOST_RPM = 3000

/** The sequence of exhaust openings as clicks and as marks. */
export function RhythmSection({ train, window, groups }: Props) {
  const { clock } = useBench()
  const id = useId()
  const beats = useMemo(() => beatsOf(exhaustPulses(train, window, groups)), [train, window, groups])
  const [on, setOn] = useState(false)
  const [volume, setVolume] = useState(0.4)
  const [pace, setPace] = useState<'drawing' | 'own'>('drawing')
  const [ownRpm, setOwnRpm] = useState(60)
  const [refused, setRefused] = useState<string | null>(null)
  const marks = useRef<MarksHandle>(null)
  const follow = useMemo<Pace>(() => {
    if (pace === 'drawing')
      return () => ({
        angle: clock.angle,
        rate: clock.playing ? (clock.reverse ? -clock.rate : clock.rate) : 0,
      })
    const rate = toSi(ownRpm, 'rpm')
    return (seconds) => ({ angle: rate * seconds, rate })
  }, [clock, pace, ownRpm])
  useRhythm({ on, beats, cycle: train.cycle, volume, pace: follow, marks })
  useEffect(() => {
    const rest = () => document.hidden && setOn(false)
    document.addEventListener('visibilitychange', rest)
    return () => document.removeEventListener('visibilitychange', rest)
  }, [])

  const enter = (text: string) => {
    const parsed = parseQuantity(text, 'speed', 'rpm')
    const rpm = parsed.ok ? fromSi(parsed.value, 'rpm') : NaN
    if (rpm >= 1 && rpm <= MOST_RPM) {
      setOwnRpm(rpm)
      setRefused(null)
    } else setRefused(text)
  }
  const percent = Math.round(volume * 100)
  return (
    <LeafSection title="Rhythm" at={on ? 'running' : 'off'}>
      <p className="read">
        One click where each exhaust opens, all alike, collectors from left to right. This is the rhythm of
        the firing order and no engine sound.
      </p>
      <div className="firing-tools">
        <Switch label={on ? 'Rhythm on' : 'Rhythm off'} on={on} onChange={setOn} />
        <Segmented
          label="Speed of the rhythm"
          value={pace}
          options={[
            { value: 'drawing', label: 'As the drawing runs' },
            { value: 'own', label: 'Own speed' },
          ]}
          onChange={setPace}
        />
        {pace === 'own' ? (
          <div className="lf firing-rpm">
            <NumberField
              id={`${id}-rpm`}
              look="box"
              unit="rpm"
              label="Speed of the rhythm"
              text={formatNumber(ownRpm, { decimals: 0 })}
              refused={refused ?? undefined}
              describedBy={refused ? `${id}-rpm-note` : undefined}
              onText={enter}
              onEscape={() => setRefused(null)}
            />
          </div>
        ) : null}
        <div className="firing-volume">
          <span className="cap">Volume {percent} %</span>
          <SliderRule
            label="Volume"
            at={volume}
            value={percent}
            min={0}
            max={100}
            valueText={`${percent} percent`}
            long={[0, 0.5, 1]}
            short={[0.1, 0.2, 0.3, 0.4, 0.6, 0.7, 0.8, 0.9]}
            onMove={setVolume}
            onStep={(by) => setVolume(Math.min(1, Math.max(0, Math.round(volume * 20 + by) / 20)))}
          />
        </div>
      </div>
      {pace === 'own' && refused !== null ? (
        <FieldNote
          id={`${id}-rpm-note`}
          head={`“${refused}” is not a speed for the rhythm.`}
          text={`Give 1 to ${formatNumber(MOST_RPM, { decimals: 0 })} rpm: faster it is a tone and no rhythm.`}
          mends={[
            { label: `Back to ${formatNumber(ownRpm, { decimals: 0 })} rpm`, run: () => setRefused(null) },
          ]}
        />
      ) : null}
      <RhythmMarks ref={marks} train={train} beats={beats} />
      <p className="cap" role="status">
        {typeof AudioContext === 'undefined'
          ? 'This browser makes no sound here; the marks show the rhythm.'
          : on && pace === 'drawing'
            ? 'Set the drawing going to hear it: it follows the slowed clock.'
            : 'Marks change three times a second at most; faster than that they stand still.'}
      </p>
    </LeafSection>
  )
}
