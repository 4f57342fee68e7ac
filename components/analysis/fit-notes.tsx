'use client'

import type { ReactNode } from 'react'
import { StatusMark } from '@/components/ui/icon'
import { formatNumber, formatQuantity } from '@/lib/units/format'
import { useResults, useSessionState } from '@/scene/session/react'
import { Figures, Note } from './note'

function Status({ ok, children }: { ok: boolean; children: ReactNode }) {
  return (
    <span className={ok ? 'st ok' : 'st mon'}>
      <StatusMark kind={ok ? 'ok' : 'monitor'} />
      {children}
    </span>
  )
}

/** What is known of the fits from the sizes alone. Ranges are common practice. */
export function FitNotes() {
  const { document, analysis, speedRpm } = useResults()
  const system = useSessionState((state) => state.system)
  const { boreMm: bore, strokeMm: stroke, rodLengthMm: rod } = document.cylinderDefaults
  const { pinDiaMm: pin, mainDiaMm: main, builtUp } = document.shape ?? {}
  const overlap = stroke && pin && main ? (pin + main) / 2 - stroke / 2 : null
  const ratio = stroke && rod ? rod / stroke : null
  const mean = analysis.train.meanPistonSpeedMS
  return (
    <>
      {overlap !== null ? (
        <Note
          title="Journal overlap"
          at={
            <Status ok={overlap >= 0 || Boolean(builtUp)}>
              {builtUp ? 'built-up crank' : 'above 0 for one piece'}
            </Status>
          }
        >
          <Figures
            rows={[{ name: 'Pin over main', figure: formatQuantity(overlap / 1000, 'length', system) }]}
          />
        </Note>
      ) : null}
      {ratio !== null ? (
        <Note title="Rod to stroke" at={<Status ok={ratio >= 1.35 && ratio <= 2.7}>usual 1.5 to 1.9</Status>}>
          <Figures
            rows={[
              { name: 'Rod to stroke', figure: { text: formatNumber(ratio, { decimals: 2 }), unit: '' } },
              ...(bore && stroke
                ? [
                    {
                      name: 'Bore to stroke',
                      figure: { text: formatNumber(bore / stroke, { decimals: 2 }), unit: '' },
                    },
                  ]
                : []),
            ]}
          />
        </Note>
      ) : null}
      <Note title="Mean piston speed" at={<Status ok={mean <= 25}>usual to 20, racing 25</Status>}>
        <Figures
          rows={[
            {
              name: `At ${formatNumber(speedRpm, { decimals: 0 })} rpm`,
              figure: formatQuantity(mean, 'velocity', system),
            },
            ...(document.operating?.maxRpm && stroke
              ? [
                  {
                    name: `At ${formatNumber(document.operating.maxRpm, { decimals: 0 })} rpm`,
                    figure: formatQuantity(
                      (2 * stroke * document.operating.maxRpm) / 60000,
                      'velocity',
                      system,
                    ),
                  },
                ]
              : []),
          ]}
        />
      </Note>
      <Note title="Swept volume" at={`${analysis.train.cylinderCount} cylinders`}>
        <Figures
          rows={[
            {
              name: 'All cylinders',
              figure: formatQuantity(analysis.train.displacementCc / 1e6, 'volume', system),
            },
          ]}
        />
      </Note>
      {analysis.cautions.length > 0 ? (
        <Note title="What the figures assume">
          <ul className="cautions">
            {analysis.cautions.map(({ code, message }) => (
              <li key={code + message}>{message}</li>
            ))}
          </ul>
        </Note>
      ) : null}
    </>
  )
}
