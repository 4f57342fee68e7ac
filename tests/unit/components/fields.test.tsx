// @vitest-environment happy-dom
import { cleanup, fireEvent, render, screen } from '@testing-library/react'
import { useState } from 'react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { NumberField } from '@/components/ui/number-field'
import { Segmented } from '@/components/ui/segmented'
import { SliderRule } from '@/components/ui/slider-rule'
import { Tabs } from '@/components/ui/tabs'

afterEach(cleanup)

describe('<NumberField>', () => {
  /** A field whose owner writes every value its own way, as the parts list does. */
  function Owned({ onText = () => {} }: { onText?: (text: string) => void }) {
    const [value, setValue] = useState(95)
    return (
      <>
        <label htmlFor="f">Bore</label>
        <NumberField
          id="f"
          text={value.toFixed(1)}
          unit="mm"
          onText={(text) => {
            onText(text)
            if (Number(text)) setValue(Number(text))
          }}
        />
      </>
    )
  }
  it('keeps what is typed letter for letter, and the written value returns when it is left', () => {
    render(<Owned />)
    const field = screen.getByLabelText<HTMLInputElement>('Bore')
    expect(field.value).toBe('95.0')
    fireEvent.focus(field)
    fireEvent.change(field, { target: { value: '92' } })
    expect(field.value).toBe('92')
    fireEvent.blur(field)
    expect(field.value).toBe('92.0')
  })
  it('tells its owner every change of the text', () => {
    const onText = vi.fn()
    render(<Owned onText={onText} />)
    fireEvent.change(screen.getByLabelText('Bore'), { target: { value: '3.74 in' } })
    expect(onText).toHaveBeenCalledWith('3.74 in')
  })
  it('refused text stays in the field, which says that it is wrong and where that is explained', () => {
    render(<NumberField id="g" label="Rod" text="156.0" refused="40" describedBy="why" onText={() => {}} />)
    const field = screen.getByLabelText<HTMLInputElement>('Rod')
    expect(field.value).toBe('40')
    expect(field.getAttribute('aria-invalid')).toBe('true')
    expect(field.getAttribute('aria-describedby')).toBe('why')
  })
  it('shows what was understood beside the field', () => {
    render(<NumberField id="h" label="Rod" look="box" text="156.0" understood="156.0" onText={() => {}} />)
    expect(document.querySelector('.und')?.textContent).toBe('156.0')
  })
  it('Enter and leaving are done, Escape is not', () => {
    const onDone = vi.fn()
    const onEscape = vi.fn()
    render(<NumberField id="i" label="Rod" text="1" onText={() => {}} onDone={onDone} onEscape={onEscape} />)
    const field = screen.getByLabelText('Rod')
    fireEvent.keyDown(field, { key: 'Escape' })
    expect(onDone).not.toHaveBeenCalled()
    expect(onEscape).toHaveBeenCalledOnce()
    fireEvent.keyDown(field, { key: 'Enter' })
    expect(onDone).toHaveBeenCalledOnce()
  })
})

describe('<Segmented>', () => {
  it('moves with the arrow keys and wraps round', () => {
    const onChange = vi.fn()
    const options = ['a', 'b', 'c'].map((value) => ({ value, label: value }))
    render(<Segmented<string> label="Letters" value="c" options={options} onChange={onChange} />)
    fireEvent.keyDown(screen.getByRole('radiogroup'), { key: 'ArrowRight' })
    expect(onChange).toHaveBeenCalledWith('a')
    expect(screen.getByRole('radio', { name: 'c' }).getAttribute('tabindex')).toBe('0')
    expect(screen.getByRole('radio', { name: 'a' }).getAttribute('tabindex')).toBe('-1')
  })
})

describe('<Tabs>', () => {
  it('names its panel by the current tab', () => {
    render(
      <Tabs label="Notes" value="one" tabs={[{ value: 'one', label: 'One' }]} onChange={() => {}}>
        inside
      </Tabs>,
    )
    const panel = screen.getByRole('tabpanel')
    expect(panel.getAttribute('aria-labelledby')).toBe(screen.getByRole('tab').id)
  })
})

describe('<SliderRule>', () => {
  it('steps by keys and tells its value in words', () => {
    const onStep = vi.fn()
    render(
      <SliderRule
        label="Shown speed"
        at={0.5}
        value={50}
        min={1}
        max={2000}
        valueText="1 to 50"
        long={[0]}
        short={[1]}
        onMove={() => {}}
        onStep={onStep}
      />,
    )
    const slider = screen.getByRole('slider', { name: 'Shown speed' })
    expect(slider.getAttribute('aria-valuetext')).toBe('1 to 50')
    fireEvent.keyDown(slider, { key: 'ArrowRight' })
    fireEvent.keyDown(slider, { key: 'PageDown' })
    expect(onStep.mock.calls).toEqual([[1], [-5]])
  })
})
