// @vitest-environment happy-dom
import { cleanup, fireEvent, render, screen } from '@testing-library/react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import GuestVerdict from '@/components/verdicts/guest-verdict'

afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
})

const address = '/api/v1/shared/t/verdict'
const hidden = { hidden: true }

function open(answer: { status: number; body: unknown }) {
  HTMLDialogElement.prototype.showModal ??= function () {}
  const sent: unknown[] = []
  vi.stubGlobal('fetch', async (to: string, { body }: RequestInit) => {
    sent.push([to, JSON.parse(String(body))])
    return Response.json(answer.body, { status: answer.status })
  })
  render(<GuestVerdict address={address} version={3} onClose={() => {}} />)
  fireEvent.change(screen.getByLabelText(/^Your name/), { target: { value: 'Delphine Astercroft' } })
  return sent
}
const send = () => fireEvent.submit(screen.getByLabelText(/^Your name/).closest('form')!)

describe('<GuestVerdict/>', () => {
  it('sends a name, a word and a sentence, and says what was given on which version', async () => {
    const sent = open({ status: 201, body: { verdict: {} } })
    fireEvent.click(screen.getByRole('radio', { name: 'Ask for changes', ...hidden }))
    fireEvent.change(screen.getByLabelText('In a sentence'), { target: { value: 'Lighter pins first.' } })
    send()
    expect(await screen.findByText(/Ask for changes, Delphine Astercroft, on version 3/)).toBeTruthy()
    expect(sent).toEqual([
      [address, { name: 'Delphine Astercroft', word: 'ask-for-changes', sentence: 'Lighter pins first.' }],
    ])
  })

  it('keeps what was typed when the word is refused, and says why', async () => {
    open({
      status: 429,
      body: { detail: 'Five words on one version are enough.', cure: 'Write to the workshop.' },
    })
    send()
    expect(await screen.findByText(/Five words on one version are enough/)).toBeTruthy()
    expect((screen.getByLabelText(/^Your name/) as HTMLInputElement).value).toBe('Delphine Astercroft')
  })
})
