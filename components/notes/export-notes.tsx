'use client'

import { useState } from 'react'
import useSWR from 'swr'
import { Dialog } from '@/components/ui/dialog'
import { addressOf, call, readAddress } from '@/lib/contracts/call'
import type { askExport, ExportAnswer } from '@/lib/contracts/exports'
import { Refused } from './refused'
import { useSending } from './use-sending'

interface Props {
  sceneId: string
  version: number
  onClose(): void
}

/** The notes as files: rows at once; the sheets with a picture of each view are made in the background. */
export function ExportNotes({ sceneId, version, onClose }: Props) {
  const [asked, setAsked] = useState<string | null>(null)
  const { busy, refused, send } = useSending()
  const { data, error } = useSWR<ExportAnswer, Error>(asked && `/api/v1/exports/${asked}`, readAddress, {
    refreshInterval: (latest) => (latest && latest.state !== 'waiting' ? 0 : 1000),
  })
  const rows = (kind: string) => addressOf(`/api/v1/scenes/{id}/notes.${kind}`, { id: sceneId }, { version })
  const ask = () =>
    void send(async () => {
      const body = { kind: 'notes-pdf', sceneId, version } as const
      const { id } = await call<typeof askExport>({ method: 'POST', path: '/api/v1/exports', body })
      setAsked(id)
    })
  const waiting = busy || (asked !== null && (!data || data.state === 'waiting'))
  return (
    <Dialog
      title="Export notes"
      about={{ k: 'As they stand in', v: `version ${version}` }}
      onClose={onClose}
      actions={
        <button type="button" className="btn" onClick={onClose}>
          Close
        </button>
      }
    >
      <p>Rows with angle, part, thread and state, or sheets with a picture of each view.</p>
      <p className="row acts2">
        <a className="btn" href={rows('csv')} download>
          CSV
        </a>
        <a className="btn" href={rows('json')} download>
          JSON
        </a>
        {data?.state === 'made' && data.fileUrl ? (
          <a className="btn pri" href={data.fileUrl} download={data.fileName ?? undefined}>
            Save the sheets
          </a>
        ) : (
          <button type="button" className="btn" disabled={waiting} onClick={ask}>
            Sheets as PDF
          </button>
        )}
      </p>
      <p role="status" className="cap">
        {waiting ? 'The sheets are being drawn; this may be closed, they are kept for seven days.' : ''}
      </p>
      <Refused
        text={
          refused ??
          error?.message ??
          (data?.state === 'failed' ? (data.reason ?? 'The sheets could not be drawn.') : null)
        }
      />
    </Dialog>
  )
}
