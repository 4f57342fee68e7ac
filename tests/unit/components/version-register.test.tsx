// @vitest-environment happy-dom
import { cleanup, fireEvent, render, screen, waitFor, within } from '@testing-library/react'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { SWRConfig } from 'swr'
import { partWords } from '@/components/versions/part-words'
import { VersionRegister } from '@/components/versions/version-register'
import type { Operation } from '@/lib/auth/access'
import type { VersionChangesAnswer } from '@/lib/contracts/versions'

const version = (number: number) => ({
  ...{ number, parent: number > 1 ? number - 1 : null, message: `Message ${number}`, state: 'draft' },
  ...{ author: 'Ysolde Karrowby', createdAt: '2026-11-13T16:40:00.000Z' },
})

const answer = (from: number, to: number): VersionChangesAnswer =>
  ({
    ...{ from: version(from), to: version(to), speedRpm: 6500 },
    parameters: [
      {
        ...{ key: 'radius', paths: [['train', 'shape', 'counterweightRadiusMm']], is: 'changed' },
        ...{ name: 'Counterweight radius', quantity: 'length', unit: 'mm', was: 89.5, now: 90.5 },
        ...{ belowPrecision: false, parts: ['counterweight:4D'] },
        effects: [
          { name: 'Skirt to counterweight', quantity: 'length', unit: 'mm', was: 2.4, now: 1.4, below: 1.5 },
        ],
      },
      {
        ...{ key: 'rod', paths: [['train', 'cylinderDefaults', 'rodLengthMm']], is: 'changed' },
        ...{ name: 'Rod length', quantity: 'length', unit: 'mm', was: 156, now: 156.02 },
        ...{ belowPrecision: true, parts: [], effects: [] },
      },
    ],
    view: [
      {
        ...{ key: 'view', paths: [['view', 'angleDeg']], is: 'changed', belowPrecision: false },
        ...{ name: 'Crank angle', quantity: 'angle', unit: '°', was: 0, now: 270 },
      },
    ],
    effects: [],
    drawn: { changed: ['counterweight:4D', 'counterweight:4F'], added: [], removed: [] },
  }) as VersionChangesAnswer

const asked: string[] = []
beforeEach(() => {
  asked.length = 0
  vi.stubGlobal('fetch', (address: string) => {
    asked.push(address)
    const { searchParams } = new URL(address, 'http://localhost')
    const body = address.includes('/changes')
      ? answer(Number(searchParams.get('from')), Number(searchParams.get('to')))
      : { versions: [3, 2, 1].map(version), next: null }
    return Promise.resolve(new Response(JSON.stringify(body)))
  })
})
afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
})

const show = (may: Operation[]) =>
  render(
    <SWRConfig value={{ provider: () => new Map() }}>
      <VersionRegister sceneId="s" title="V8" may={may} numberOf={() => 15} />
    </SWRConfig>,
  )
const changes = () => within(screen.getByRole('region', { name: 'What changed' }))

describe('<VersionRegister>', () => {
  it('sets the latest against the one before it, and any two that are chosen', async () => {
    show(['scene.read'])
    const row = await screen.findByRole('row', { name: /Counterweight radius/ })
    expect(row.textContent).toBe('Row 15Counterweight radius89.590.5mm')
    expect(screen.getByText('From version 2 to 3')).toBeTruthy()
    expect(changes().getByText('below 1.5 mm')).toBeTruthy()
    fireEvent.click(screen.getByRole('radio', { name: 'Compare from version 1' }))
    await screen.findByText('From version 1 to 3')
    await waitFor(() => expect(asked.some((address) => address.includes('from=1&to=3'))).toBe(true))
    fireEvent.click(screen.getByRole('radio', { name: 'Compare to version 1' }))
    expect(screen.getByText('Choose two versions that are not the same.')).toBeTruthy()
  })

  it('counts changes of the view and those below display precision, and shows them when asked', async () => {
    show(['scene.read'])
    await screen.findByText(/View only: 1 change\. Below display precision: 1\./)
    expect(changes().queryByText(/156\.02/)).toBeNull()
    fireEvent.click(changes().getByRole('button', { name: 'Show them' }))
    expect(changes().getByText('Rod length: 156 mm, now 156.02 mm')).toBeTruthy()
    expect(changes().getByRole('row', { name: /Crank angle/ }).textContent).toBe('Row 15Crank angle0.0270.0°')
  })

  it('offers to restore only to those who may save, and never the latest', async () => {
    show(['scene.read'])
    await screen.findByRole('row', { name: /Version 3/ })
    expect(screen.queryByRole('button', { name: /^Restore/ })).toBeNull()
    cleanup()
    show(['scene.read', 'scene.save'])
    await screen.findByRole('row', { name: /Version 3/ })
    const names = screen.getAllByRole('button', { name: /^Restore/ }).map(({ textContent }) => textContent)
    expect(names).toEqual(['Restore… version 2', 'Restore… version 1'])
  })
})

describe('partWords(ids)', () => {
  it('names a few of a kind and counts many', () => {
    const many = [1, 2, 3, 4].map((id) => `piston:${id}`)
    expect(partWords(['counterweight:4D', 'counterweight:4F', ...many, 'crank-pin:2', 'flywheel'])).toBe(
      'counterweights 4D and 4F, 4 pistons, crank pin 2, flywheel',
    )
  })
})
