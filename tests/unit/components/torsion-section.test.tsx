// @vitest-environment happy-dom
import { cleanup, fireEvent, render, screen, within } from '@testing-library/react'
import { afterEach, describe, expect, it } from 'vitest'
import { TorsionSection } from '@/components/loads/torsion-section'
import { cycleParts } from '@/lib/mechanics/loads/cycle-parts'
import type { CrankTrain } from '@/scene/model/crank-train'
import { newScene } from '@/scene/model/default-scene'
import { presetById, presets } from '@/scene/model/presets'
import { createClock } from '@/scene/session/clock'
import { BenchContext, ResultsContext } from '@/scene/session/react'
import { createResults } from '@/scene/session/results'
import { createSession } from '@/scene/session/session'

afterEach(cleanup)

function show(train: CrankTrain) {
  const scene = newScene(train)
  const results = createResults()(scene)
  render(
    <BenchContext value={{ session: createSession({ scene }), clock: createClock() }}>
      <ResultsContext value={results}>
        <TorsionSection parts={cycleParts(results.train, 90)} />
      </ResultsContext>
    </BenchContext>,
  )
}

const CRITICALS = 'Critical speeds by order, those in or near the running range first'
const documentOf = (id: string) => presetById(id)!.train
const table = (name: string) => within(screen.getByRole('table', { name }))
const firstFrequency = () =>
  Number(table('Modes').getAllByRole('row')[1].querySelectorAll('td')[2].textContent)

describe('<TorsionSection>', () => {
  it.each(presets.map(({ id }) => id))('shows modes, criticals, chain, limits and caution of %s', (id) => {
    show(documentOf(id))
    const { throws } = documentOf(id)
    expect(table('Modes').getAllByRole('row')).toHaveLength(throws.length + 2)
    expect(table('The crank as inertias and springs').getAllByRole('row')).toHaveLength(throws.length + 3)
    expect(table(CRITICALS).getAllByRole('row').length).toBeGreaterThan(10)
    expect(screen.getByRole('slider', { name: 'Mode shapes' })).toBeTruthy()
    expect(screen.getByRole('slider', { name: 'Frequencies over speed' })).toBeTruthy()
    expect(screen.getByText(/Lumped inertias on springs without mass, undamped/)).toBeTruthy()
    expect(screen.getByText(/a qualified person come first/)).toBeTruthy()
    expect(document.body.textContent).not.toMatch(/NaN|Infinity|undefined/)
  })

  it('flags the criticals of the running range by shape and word', () => {
    show(documentOf('i6-3000'))
    const criticals = table(CRITICALS)
    expect(screen.getByText(/^Criticals: \d+ lie from/)).toBeTruthy()
    expect(criticals.queryAllByText('outside')).toHaveLength(0)
    expect(criticals.getAllByText('◆ in the range').length).toBeGreaterThan(0)
    expect(criticals.getAllByText('◇ near it').length).toBeGreaterThan(0)
    while (criticals.queryAllByText('outside').length === 0)
      fireEvent.click(screen.getByRole('button', { name: 'Later rows' }))
  })

  it('goes by a stiffer steel, by a given stiffness, and back', () => {
    show(documentOf('i4-2000'))
    const steel = firstFrequency()
    const modulus = screen.getByLabelText('Shear modulus')
    fireEvent.change(modulus, { target: { value: '316' } })
    expect(firstFrequency() / steel).toBeCloseTo(2, 2)
    fireEvent.change(screen.getByLabelText('Stiffness of a throw, main to main'), {
      target: { value: '100' },
    })
    const given = firstFrequency()
    expect(given).toBeLessThan(steel)
    expect(screen.getByText(/The stiffness of a throw was given/)).toBeTruthy()
    fireEvent.click(screen.getByRole('button', { name: 'Go by the sizes again' }))
    expect(firstFrequency() / steel).toBeCloseTo(2, 2)
  })

  it('keeps what it refuses in the field, with its reason', () => {
    show(documentOf('i4-2000'))
    const modulus = screen.getByLabelText<HTMLInputElement>('Shear modulus')
    const steel = firstFrequency()
    fireEvent.change(modulus, { target: { value: '-5' } })
    fireEvent.blur(modulus)
    expect(modulus.value).toBe('-5')
    expect(screen.getByText(/Read as −5\.000 GPa/).textContent).toContain('79.0 GPa still stands')
    expect(firstFrequency()).toBe(steel)
  })

  it('names what is missing, and does with a stiffness where sizes are', () => {
    const { inertia: _, ...bare } = documentOf('i4-2000')
    show(bare)
    expect(
      screen.getByText(/Missing: the inertia of the free end and the inertia of the flywheel/),
    ).toBeTruthy()
    expect(screen.queryByRole('table')).toBeNull()
    cleanup()
    const { shape: __, ...plain } = documentOf('i4-2000')
    show(plain)
    expect(screen.getByText(/or the stiffness of a throw above/)).toBeTruthy()
    fireEvent.change(screen.getByLabelText('Stiffness of a throw, main to main'), {
      target: { value: '600' },
    })
    expect(firstFrequency()).toBeGreaterThan(100)
    expect(screen.getByText(/count as nothing: the true frequencies are lower/)).toBeTruthy()
  })

  it('says that no range is known where no operating speed is entered', () => {
    const { operating: _, ...bare } = documentOf('i4-2000')
    show(bare)
    expect(screen.getByText(/Neither a maximum nor a rated speed is entered/)).toBeTruthy()
  })
})
