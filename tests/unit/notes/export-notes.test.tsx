// @vitest-environment happy-dom
import { cleanup, fireEvent, render, screen } from '@testing-library/react'
import { SWRConfig } from 'swr'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { ExportNotes } from '@/components/notes/export-notes'

afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
})

const file = {
  ...{ id: 'e1', kind: 'notes-pdf', sceneId: 's1', version: 4, reason: null, fileName: null, fileUrl: null },
  ...{ createdAt: '2026-12-01T00:00:00.000Z', endsAt: '2026-12-08T00:00:00.000Z' },
}

/** The first answer is to the asking, the second to how far it is. */
function serve(after: object) {
  const sent: unknown[] = []
  vi.stubGlobal('fetch', async (address: string, { method = 'GET', body }: RequestInit = {}) => {
    sent.push([method, address, typeof body === 'string' ? JSON.parse(body) : null])
    const [answer, status] =
      method === 'POST' ? [{ ...file, state: 'waiting' }, 202] : [{ ...file, ...after }, 200]
    return Response.json(answer, { status })
  })
  return sent
}
const open = () => {
  HTMLDialogElement.prototype.showModal ??= function () {}
  render(
    <SWRConfig value={{ provider: () => new Map() }}>
      <ExportNotes sceneId="s1" version={4} onClose={() => {}} />
    </SWRConfig>,
  )
  fireEvent.click(screen.getByRole('button', { name: 'Sheets as PDF', hidden: true }))
}

describe('<ExportNotes/>', () => {
  it('has the sheets drawn in the background and offers them once they are there', async () => {
    const sent = serve({ state: 'made', fileName: 'notes.pdf', fileUrl: '/api/v1/exports/e1/file' })
    open()
    const link = await screen.findByText('Save the sheets')
    expect(link.getAttribute('href')).toBe('/api/v1/exports/e1/file')
    expect(sent).toEqual([
      ['POST', '/api/v1/exports', { kind: 'notes-pdf', sceneId: 's1', version: 4 }],
      ['GET', '/api/v1/exports/e1', null],
    ])
    expect(screen.getByText('CSV').getAttribute('href')).toBe('/api/v1/scenes/s1/notes.csv?version=4')
  })

  it('says why they could not be drawn', async () => {
    serve({ state: 'failed', reason: 'The version is gone.' })
    open()
    expect(await screen.findByText('The version is gone.')).toBeTruthy()
  })
})
