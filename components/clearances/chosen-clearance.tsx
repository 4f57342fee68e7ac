'use client'

import { useCallback, useMemo } from 'react'
import { crankAngleAxis, DEGREES, quantityAxis } from '@/components/figures/axis'
import { behindClearance } from '@/components/figures/behind-clearance'
import { Figures } from '@/components/figures/note'
import { LeafSection } from '@/components/figures/leaf'
import { LineChart } from '@/components/ui/charts/line-chart'
import { clearanceModel, gapOf } from '@/lib/mechanics/clearance/clearances'
import { formatQuantity, quantityText } from '@/lib/units/format'
import type { ListedClearance } from '@/scene/frame/clearance-list'
import { clearanceMends, type ClearanceMend } from '@/scene/frame/clearance-mends'
import { clearanceAssumption, clearanceSentence, inSentence } from '@/scene/frame/clearance-words'
import { inTrain } from '@/scene/session/path'
import { useBench, useSessionState } from '@/scene/session/react'
import type { Clearances } from '@/components/figures/use-clearances'
import { ClearanceMark } from './status'

interface Props extends Clearances {
  clearance: ListedClearance
  onGo(clearance: ListedClearance): void
}

/** One pair: how it stands, what would mend it, and its gap over the turn. */
export function ChosenClearance({ clearance, onGo, sizes, results }: Props) {
  const { session } = useBench()
  const system = useSessionState((state) => state.system)
  const { document, train, model } = results
  const mends = useMemo(
    () => (clearance.status === 'clear' ? [] : clearanceMends(document, model.rig, clearance, system)),
    [clearance, document, model.rig, system],
  )
  const take = ({ changes }: ClearanceMend) => {
    session.seal()
    session.edit(inTrain(changes))
  }
  const sentence = clearanceSentence(clearance, system)
  return (
    <LeafSection title={clearance.name} at={<ClearanceMark status={clearance.status} />} wide>
      <div className="clearance-pair">
        <div className="clearance-said">
          {clearance.status === 'clear' ? (
            <p className="read">{sentence}</p>
          ) : (
            <div className={clearance.status === 'touches' ? 'errnote' : 'clearance-close'} role="status">
              <p>
                {sentence}
                {mends.length > 0 ? ' Any one of these gives it its limit:' : ''}
              </p>
              {mends.length > 0 ? (
                <div className="row">
                  {mends.map((mend) => (
                    <button key={mend.label} type="button" className="btn sm" onClick={() => take(mend)}>
                      {mend.label}
                    </button>
                  ))}
                </div>
              ) : null}
            </div>
          )}
          <Figures
            rows={[
              {
                name: 'Least gap',
                figure: formatQuantity(clearance.gap, 'length', system),
                behind: behindClearance(clearance, train, sizes),
              },
            ]}
          />
          <p className="cap">{clearanceAssumption[clearance.pair.kind]}</p>
          <div className="row">
            <button type="button" className="btn" onClick={() => onGo(clearance)}>
              Go to it
            </button>
          </div>
        </div>
        {clearance.angle === null ? null : <GapChart clearance={clearance} train={train} sizes={sizes} />}
      </div>
    </LeafSection>
  )
}

function GapChart({
  clearance,
  train,
  sizes,
}: Pick<Props, 'clearance' | 'sizes'> & Pick<Clearances['results'], 'train'>) {
  const { clock } = useBench()
  const system = useSessionState((state) => state.system)
  const { pair, gap, angle, limit, labels } = clearance
  const { x, y, series } = useMemo(() => {
    const at = gapOf(clearanceModel(train, sizes), pair)
    const degrees = Array.from({ length: 361 }, (_, degree) => degree)
    const gaps = degrees.map((degree) => at(degree / DEGREES))
    const y = quantityAxis('Gap', 'length', Math.max(...gaps), system)
    return {
      x: { ...crankAngleAxis, values: degrees, span: { from: 0, to: 360, at: [0, 90, 180, 270, 360] } },
      y,
      series: [
        { name: 'gap', look: 'v' as const, ys: y.all(gaps) },
        { name: 'limit', look: 'past' as const, ys: y.all(degrees.map(() => limit)) },
      ],
    }
  }, [train, sizes, pair, limit, system])
  const follow = useCallback(
    (move: (x: number) => void) => {
      const show = () => move((clock.angle * DEGREES) % 360)
      show()
      return clock.subscribe(show)
    },
    [clock],
  )
  const least = quantityText(gap, 'length', system)
  return (
    <LineChart
      title="Gap over one turn"
      sentence={`${labels[0]} to ${inSentence(labels[1])}: least ${least} at ${quantityText(angle ?? 0, 'angle', system)}, limit ${quantityText(limit, 'length', system)}.`}
      x={x}
      y={y}
      series={series}
      marks={[{ x: (angle ?? 0) * DEGREES, y: y.shown(gap), text: least }]}
      follow={follow}
    />
  )
}
