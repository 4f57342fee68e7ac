// @vitest-environment happy-dom
import { cleanup, fireEvent, render, screen, within } from '@testing-library/react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { MergeDialog } from '@/components/bench/merge-dialog'
import { rowNumber } from '@/components/bench/row-number'
import type { Instead } from '@/components/bench/use-saving'
import type { SaveConflict } from '@/lib/contracts/scenes'
import { compareScenes } from '@/scene/model/compare-scenes'
import { newScene } from '@/scene/model/default-scene'
import { presetById } from '@/scene/model/presets'
import type { Scene } from '@/scene/model/scene'
import { createClock } from '@/scene/session/clock'
import { BenchContext } from '@/scene/session/react'
import { createSession } from '@/scene/session/session'

afterEach(cleanup)

const base = newScene(presetById('v8x-5000')!.train)

function but(change: {
  radius?: number
  pin?: number
  rings?: number
  rod?: number
  stroke?: number
}): Scene {
  const { shape, masses, cylinderDefaults } = base.train
  return {
    ...base,
    train: {
      ...base.train,
      shape: { ...shape, counterweightRadiusMm: change.radius ?? shape!.counterweightRadiusMm },
      masses: {
        ...masses,
        pistonPinKg: change.pin ?? masses.pistonPinKg,
        ringsKg: change.rings ?? masses.ringsKg,
      },
      cylinderDefaults: {
        ...cylinderDefaults,
        rodLengthMm: change.rod ?? cylinderDefaults.rodLengthMm,
        strokeMm: change.stroke ?? cylinderDefaults.strokeMm,
      },
    },
  }
}

function show(theirs: Scene, mine: Scene) {
  const version = { parent: null, author: 'Ysolde Karrowby', createdAt: '2026-11-13T16:40:00.000Z' }
  const conflict: SaveConflict = {
    head: { ...version, number: 4, message: 'lighter pin', state: 'draft', document: theirs },
    base: { ...version, number: 3, message: '', state: 'draft', document: base },
    yours: { base: 3, message: 'radius up', document: mine },
  }
  const onSave = vi.fn<(message: string, instead: Instead) => void>()
  const onTheirs = vi.fn()
  render(
    <BenchContext value={{ session: createSession({ scene: mine }), clock: createClock() }}>
      <MergeDialog {...{ conflict, onSave, onTheirs }} busy={false} problem={null} onClose={() => {}} />
    </BenchContext>,
  )
  return { onSave, onTheirs }
}

const button = (name: string) => screen.getByRole<HTMLButtonElement>('button', { name, hidden: true })
const rowsOf = (name: string) =>
  within(screen.getByRole('table', { name, hidden: true }))
    .getAllByRole('row', { hidden: true })
    .map((row) => row.textContent)

describe('<MergeDialog>', () => {
  it('shows what each did since their common base, with the numbers of the parts list', () => {
    show(but({ pin: 0.11 }), but({ radius: 90.5 }))
    const number = rowNumber(compareScenes(base, but({ radius: 90.5 })).parameters[0], base)
    expect(number).toBeGreaterThan(0)
    expect(rowsOf('Yours since version 3')[1]).toBe(`Row ${number}Counterweight radius89.590.5mm`)
    expect(rowsOf('Version 4 since version 3')[1]).toContain('Piston pin mass112.0110.0g')
  })

  it('without a value that both changed, both are saved on top of the head with one press', () => {
    const { onSave } = show(but({ pin: 0.11 }), but({ radius: 90.5 }))
    fireEvent.click(button('Save both as version 5'))
    const [message, { document, onTopOf }] = onSave.mock.lastCall!
    expect([message, onTopOf]).toEqual(['radius up', 4])
    expect(document.train).toMatchObject({
      shape: { counterweightRadiusMm: 90.5 },
      masses: { pistonPinKg: 0.11 },
    })
  })

  it('a value that both changed holds the save until it is chosen, and the choice is what is saved', () => {
    const { onSave } = show(but({ pin: 0.11, rings: 0.03 }), but({ pin: 0.115, radius: 90.5 }))
    expect(button('Save both as version 5').disabled).toBe(true)
    const chosen = screen.getByRole('group', { name: /Piston pin mass/, hidden: true })
    expect(chosen.textContent).toContain('was 112.0 g')
    fireEvent.click(within(chosen).getByRole('radio', { name: /Version 4 ?110.0 g/, hidden: true }))
    fireEvent.click(button('Save both as version 5'))
    expect(onSave.mock.lastCall![1].document.train.masses).toMatchObject({ pistonPinKg: 0.11, ringsKg: 0.03 })
    fireEvent.click(within(chosen).getByRole('radio', { name: /Mine ?115.0 g/, hidden: true }))
    fireEvent.click(button('Save both as version 5'))
    expect(onSave.mock.lastCall![1].document.train.masses).toMatchObject({
      pistonPinKg: 0.115,
      ringsKg: 0.03,
    })
  })

  it('what cannot stand together is held with the reason, and each of the other three ways is open', () => {
    const mine = but({ rod: 60 })
    const { onSave, onTheirs } = show(but({ stroke: 130 }), mine)
    expect(screen.getByRole('alert', { hidden: true }).textContent).toContain('60 mm')
    expect(button('Save both as version 5').disabled).toBe(true)
    fireEvent.click(screen.getByRole('radio', { name: /^Mine on top/, hidden: true }))
    fireEvent.click(button('Save mine as version 5'))
    expect(onSave.mock.lastCall).toEqual(['radius up', { document: mine, onTopOf: 4 }])
    fireEvent.click(screen.getByRole('radio', { name: /^A scene of its own/, hidden: true }))
    fireEvent.click(button('Save as a scene of its own'))
    expect(onSave.mock.lastCall).toEqual(['radius up', { document: mine, onTopOf: null }])
    fireEvent.click(screen.getByRole('radio', { name: /^Let mine go/, hidden: true }))
    fireEvent.click(button('Open version 4'))
    expect(onTheirs).toHaveBeenCalledOnce()
  })
})
