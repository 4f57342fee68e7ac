// @vitest-environment happy-dom
import { cleanup, fireEvent, render, screen } from '@testing-library/react'
import { SWRConfig } from 'swr'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { AskDialog } from '@/components/sharing/ask-dialog'
import { LinkRegister } from '@/components/sharing/link-register'
import { operationsOf } from '@/lib/auth/access'
import type { ShareLink } from '@/lib/contracts/share-links'

afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
})

const link: ShareLink = {
  ...{
    id: 'l1',
    sceneId: 's1',
    label: 'For Delphine',
    kind: 'look',
    version: null,
    state: 'live',
    endsAt: null,
  },
  ...{ locked: false, frameOrigins: [], revokedAt: null, opened: 1, lastOpenedAt: null, questions: 1 },
  ...{ createdBy: 'Fenn', createdAt: '2026-02-20T12:00:00.000Z' },
}
const opening = {
  ...{ id: 'o1', openedAt: '2026-02-21T12:00:00.000Z', device: 'phone', version: 3 },
  ...{ drawingSeconds: 75, figuresSeconds: 4, notesSeconds: 0 },
}
const question = {
  ...{ id: 'q1', askedAt: '2026-02-21T12:00:00.000Z', version: 3, name: 'Delphine', email: 'd@example.com' },
  ...{ question: 'Which rod?', angleDeg: 40, view: null },
}

/** Answers by the end of the address; what was sent is kept. */
function serve(answers: Record<string, { status?: number; body: unknown }>) {
  const sent: { address: string; method: string; body: unknown }[] = []
  vi.stubGlobal('fetch', async (address: string, { method = 'GET', body }: RequestInit = {}) => {
    sent.push({ address, method, body: typeof body === 'string' ? JSON.parse(body) : null })
    const [, answer] = Object.entries(answers).find(([end]) => address.split('?')[0].endsWith(end)) ?? []
    return new Response(JSON.stringify(answer?.body ?? {}), { status: answer?.status ?? 200 })
  })
  return sent
}

const answers = {
  '/share-links': { body: { links: [link] } },
  '/openings': { body: { openings: [opening], keptDays: 90, next: null } },
  '/questions': { body: { questions: [question], next: null } },
  '/share-links/l1': { body: { link } },
}

const register = (role: 'owner' | 'sales') =>
  render(
    <SWRConfig value={{ provider: () => new Map() }}>
      <LinkRegister
        {...{ sceneId: 's1', title: 'V8', headVersion: 3, workshop: 'Larkspur', first: null }}
        may={operationsOf(role)}
      />
    </SWRConfig>,
  )

describe('<LinkRegister/>', () => {
  it('shows who opened a link, on what and how long, and what was asked', async () => {
    serve(answers)
    register('sales')
    expect(await screen.findByText('1 min 15 s')).toBeTruthy()
    expect(screen.getByText('phone')).toBeTruthy()
    fireEvent.click(screen.getByRole('tab', { name: 'Questions' }))
    expect(await screen.findByText('Which rod?')).toBeTruthy()
  })

  it('changes a link, keeping its end and password where nobody touched them', async () => {
    const sent = serve(answers)
    register('owner')
    fireEvent.click(await screen.findByRole('tab', { name: 'What it lets' }))
    fireEvent.click(screen.getByRole('radio', { name: 'look and note' }))
    fireEvent.click(screen.getByRole('button', { name: 'Change the link' }))
    expect(await screen.findByText(/The link is changed/)).toBeTruthy()
    const change = sent.find(({ method }) => method === 'PATCH')
    expect(change?.body).toEqual({
      label: 'For Delphine',
      kind: 'note',
      version: null,
      password: null,
      frameOrigins: [],
    })
  })
})

describe('<AskDialog/>', () => {
  it('keeps what was typed and says at the field what was refused; then says that it is on its way', async () => {
    HTMLDialogElement.prototype.showModal ??= function () {}
    const refusal = { path: 'email', code: 'x', message: 'This is not an e-mail address.', fix: 'Give one.' }
    serve({
      '/questions': { status: 422, body: { detail: 'Refused.', cure: 'See the field.', issues: [refusal] } },
    })
    render(<AskDialog token="t" pass={null} moving={null} onClose={() => {}} />)
    fireEvent.change(screen.getByLabelText('Mail address'), { target: { value: 'delphine' } })
    fireEvent.submit(screen.getByLabelText('Mail address').closest('form')!)
    expect(await screen.findByText(/This is not an e-mail address/)).toBeTruthy()
    expect((screen.getByLabelText('Mail address') as HTMLInputElement).value).toBe('delphine')
    const sent = serve({ '/questions': { status: 202, body: {} } })
    fireEvent.submit(screen.getByLabelText('Mail address').closest('form')!)
    expect(await screen.findByText('The question is on its way')).toBeTruthy()
    expect(sent[0]).toMatchObject({
      address: '/api/v1/shared/t/questions',
      body: { email: 'delphine', website: '' },
    })
  })
})
