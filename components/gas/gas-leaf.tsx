'use client'

import { useMemo, useState, type ReactNode } from 'react'
import { BehindFigure } from '@/components/figures/behind'
import { useCylinderChoice } from '@/components/figures/cylinder-choice'
import { Leaf, LeafSection } from '@/components/figures/leaf'
import { Caution } from '@/components/figures/note'
import { DocumentField } from '@/components/figures/document-field'
import { SpeedWords } from '@/components/figures/speed-words'
import { formatNumber, quantityText } from '@/lib/units/format'
import type { System } from '@/lib/units/quantities'
import { toSi } from '@/lib/units/units'
import { crankcaseField, heatReleaseFields } from '@/scene/session/gas-fields'
import { useBench, useResults, useSessionState } from '@/scene/session/react'
import { gasLine, modelOf, type Gas, type GasLine, type Trace } from './gas-lines'
import { IndicatedFigures } from './indicated-figures'
import { AngleChart, VolumeChart } from './pressure-charts'
import { TraceFile, type ChosenTrace } from './trace-file'

/** What burns in the cylinders: the model's figures beside its pressures, and a measured trace over them. */
export function GasLeaf() {
  const { session } = useBench()
  const { document, speedRpm } = useResults()
  const system = useSessionState((state) => state.system)
  const past = useSessionState((state) => state.past)
  const base = useSessionState((state) => state.base)
  const scene = useSessionState((state) => state.scene)
  const { cylinder: id, choice } = useCylinderChoice()
  const [chosen, setChosen] = useState<ChosenTrace | null>(null)
  const { gas, cycle } = document
  const cylinder = document.cylinders.findIndex((each) => each.id === id)
  const model = useMemo(() => modelOf({ scene, past, base }), [scene, past, base])

  const waiting = chosen?.read.ok ? chosen.read : null
  const { angleDeg, pressureBar } = waiting ?? {}
  const measured = useMemo<Trace | null>(
    () =>
      angleDeg && pressureBar
        ? { model: 'trace', angleDeg, pressureBar }
        : gas.model === 'trace'
          ? gas
          : null,
    [angleDeg, pressureBar, gas],
  )
  const lines = useMemo(() => {
    const speed = toSi(speedRpm, 'rpm')
    const modelled = gasLine('model', model, document, speed, cylinder)
    if (!measured) return [modelled]
    const trace = gasLine('measured', measured, document, speed, cylinder)
    return gas.model === 'trace' ? [trace, modelled] : [modelled, trace]
  }, [model, measured, gas.model, document, speedRpm, cylinder])
  /** One undo step, whatever was being typed before. */
  const become = (next: Gas) => {
    session.seal()
    session.edit([{ path: ['train', 'gas'], value: next }])
    setChosen(null)
  }
  return (
    <Leaf title="Gas" sentence={sentence(gas, lines, system)}>
      <LeafSection
        title="Heat release"
        at={gas.model === 'heat-release' ? 'in the engine' : 'not in the engine'}
      >
        {gas.model === 'heat-release' ? (
          <div className="gas-fields">
            {Object.values(heatReleaseFields).map((field) => (
              <DocumentField key={field.key} field={field} />
            ))}
            <DocumentField field={crankcaseField} />
          </div>
        ) : (
          <>
            <p className="read">
              {gas.model === 'none'
                ? 'This engine has no gas: no pressure works on its pistons. The model shown is a usual one for its size.'
                : `The engine runs on a measured trace of ${formatNumber(gas.angleDeg.length, { decimals: 0 })} points. The model it is compared with is the last that it had.`}
            </p>
            <div className="row">
              <button type="button" className="btn" onClick={() => become(model)}>
                {gas.model === 'none' ? 'Use the model' : 'Back to the model'}
              </button>
            </div>
          </>
        )}
      </LeafSection>
      <LeafSection title="Measured trace" at={gas.model === 'trace' ? 'in the engine' : 'not in the engine'}>
        <TraceFile cycle={cycle} chosen={chosen} onChosen={setChosen} />
        {chosen && waiting ? (
          <div className="gas-waiting" role="status">
            <p>
              <b>{chosen.name}</b>: {formatNumber(waiting.angleDeg.length, { decimals: 0 })} points, shown
              over the model. {waiting.understood.join(' ')}
            </p>
            <div className="row">
              <button
                type="button"
                className="btn pri"
                onClick={() =>
                  become({
                    model: 'trace',
                    angleDeg: waiting.angleDeg,
                    pressureBar: waiting.pressureBar,
                  })
                }
              >
                Use the trace
              </button>
              <button type="button" className="btn" onClick={() => setChosen(null)}>
                Put it away
              </button>
            </div>
          </div>
        ) : null}
      </LeafSection>
      <LeafSection title="Pressure" at={choice}>
        <AngleChart lines={lines} cylinder={cylinder} />
      </LeafSection>
      <LeafSection title="Work" at={choice}>
        <VolumeChart lines={lines} cylinder={cylinder} />
      </LeafSection>
      <LeafSection title="Indicated" at={<SpeedWords />} wide>
        <IndicatedFigures lines={lines} />
      </LeafSection>
      <Caution />
    </Leaf>
  )
}

function sentence(gas: Gas, lines: GasLine[], system: System): ReactNode {
  if (gas.model === 'none')
    return 'No gas works in this engine. Take the model below, or bring in a measured trace.'
  const { engine } = lines[0]
  const [net, gross] = [engine.netPressure, engine.grossPressure].map((pressure) =>
    quantityText(pressure, 'pressure', system),
  )
  const power = quantityText(engine.power, 'power', system)
  return (
    <>
      The {gas.model === 'trace' ? 'measured trace' : 'model'} indicates{' '}
      <BehindFigure behind="imep" label={`Net mean effective pressure, ${net}`}>
        {net}
      </BehindFigure>{' '}
      net,{' '}
      <BehindFigure behind="imep-gross" label={`Gross mean effective pressure, ${gross}`}>
        {gross}
      </BehindFigure>{' '}
      gross:{' '}
      <BehindFigure behind="indicated-power" label={`Indicated power, ${power}`}>
        {power}
      </BehindFigure>
      .
    </>
  )
}
