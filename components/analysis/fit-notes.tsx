'use client'

import type { ReactNode } from 'react'
import { StatusMark } from '@/components/ui/icon'
import { formatNumber, formatQuantity } from '@/lib/units/format'
import { always } from '@/scene/model/class-ranges'
import { usualRange } from '@/scene/model/engine-class'
import { useResults, useSessionState } from '@/scene/session/react'
import { Figures, Note } from '@/components/figures/note'
import { ClearanceNote } from './clearance-note'

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
  const ratios = usualRange(document, 'rodToStroke') ?? always.rodToStroke
  const mostSpeed = usualRange(document, 'pistonSpeedMost')?.[1] ?? 25
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
            rows={[
              {
                name: 'Pin over main',
                figure: formatQuantity(overlap / 1000, 'length', system),
                behind: 'journal-overlap',
              },
            ]}
          />
        </Note>
      ) : null}
      {ratio !== null ? (
        <Note
          title="Rod to stroke"
          at={
            <Status
              ok={ratio >= ratios[0] && ratio <= ratios[1]}
            >{`usual ${ratios[0]} to ${ratios[1]}`}</Status>
          }
        >
          <Figures
            rows={[
              {
                name: 'Rod to stroke',
                figure: { text: formatNumber(ratio, { decimals: 2 }), unit: '' },
                behind: 'rod-to-stroke',
              },
              ...(bore && stroke
                ? [
                    {
                      name: 'Bore to stroke',
                      figure: { text: formatNumber(bore / stroke, { decimals: 2 }), unit: '' },
                      behind: 'bore-to-stroke' as const,
                    },
                  ]
                : []),
            ]}
          />
        </Note>
      ) : null}
      <ClearanceNote />
      <Note
        title="Mean piston speed"
        at={<Status ok={mean <= mostSpeed}>{`usual to ${mostSpeed} m/s`}</Status>}
      >
        <Figures
          rows={[
            {
              name: `At ${formatNumber(speedRpm, { decimals: 0 })} rpm`,
              figure: formatQuantity(mean, 'velocity', system),
              behind: 'mean-piston-speed',
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
              behind: 'displacement',
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
