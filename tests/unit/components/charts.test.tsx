// @vitest-environment happy-dom
import { cleanup, fireEvent, render, screen } from '@testing-library/react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { BarChart } from '@/components/ui/charts/bar-chart'
import { LineChart } from '@/components/ui/charts/line-chart'
import { ScatterChart } from '@/components/ui/charts/scatter-chart'
import { DataTable } from '@/components/ui/data-table'

afterEach(cleanup)

const format = (value: number) => value.toFixed(1)
const line = {
  title: 'Turning moment',
  sentence: 'Moment over 720 degrees',
  x: {
    name: 'Crank angle',
    unit: '°',
    format,
    values: [0, 180, 360, 540],
    span: { from: 0, to: 720, at: [0, 360, 720] },
  },
  y: { name: 'Moment', unit: 'N m', format },
  series: [{ name: 'total', look: 'res' as const, ys: [0, 1, 0, -1] }],
}

describe('<LineChart>', () => {
  it('has a title, a sentence, axis names with units, and the same figures as a table', () => {
    render(<LineChart {...line} />)
    expect(screen.getByRole('figure', { name: 'Turning moment' })).toBeTruthy()
    expect(screen.getByRole('img', { name: 'Moment over 720 degrees' })).toBeTruthy()
    expect(screen.getByText('Moment, N m')).toBeTruthy()
    expect(screen.getByText('Crank angle, °')).toBeTruthy()
    expect(screen.queryByRole('table')).toBeNull()
    fireEvent.click(screen.getByRole('button', { name: 'Table' }))
    expect(screen.getAllByRole('row')).toHaveLength(5)
    expect(screen.getByRole('columnheader', { name: 'Moment, N m' })).toBeTruthy()
  })

  it('reads its points by arrow keys, and says each', () => {
    const chosen = vi.fn()
    render(<LineChart {...line} onChoose={chosen} />)
    const reading = screen.getByRole('slider', { name: 'Turning moment' })
    fireEvent.keyDown(reading, { key: 'Home' })
    fireEvent.keyDown(reading, { key: 'ArrowRight' })
    expect(reading.getAttribute('aria-valuetext')).toBe('Crank angle 180.0°: 1.0 N m')
    fireEvent.keyDown(reading, { key: 'End' })
    fireEvent.keyDown(reading, { key: 'ArrowRight' })
    expect(reading.getAttribute('aria-valuetext')).toBe('Crank angle 540.0°: -1.0 N m')
    fireEvent.keyDown(reading, { key: 'Enter' })
    expect(chosen).toHaveBeenCalledWith(3)
  })

  it('follows the cursor without drawing itself again', () => {
    let move: ((x: number) => void) | null = null
    const drawn = vi.fn(format)
    const follow = (to: (x: number) => void) => {
      move = to
      return () => {}
    }
    render(<LineChart {...line} y={{ ...line.y, format: drawn }} follow={follow} />)
    const before = drawn.mock.calls.length
    move!(360)
    const cursor = document.querySelector('.chart-cursor')!
    const half = cursor.getAttribute('transform')
    move!(720)
    expect(cursor.getAttribute('transform')).not.toBe(half)
    expect(drawn.mock.calls.length).toBe(before)
  })
})

describe('<BarChart> and <ScatterChart>', () => {
  it('a bar that stands out says why when it is read', () => {
    render(
      <BarChart
        title="Harmonics"
        sentence="Orders of the moment"
        x={{ name: 'Order', unit: '', format }}
        y={{ name: 'Moment', unit: 'N m', format }}
        bars={[
          { x: 0.5, y: 3 },
          { x: 1, y: 12, mark: 'major order' },
        ]}
      />,
    )
    const reading = screen.getByRole('slider', { name: 'Harmonics' })
    fireEvent.keyDown(reading, { key: 'End' })
    expect(reading.getAttribute('aria-valuetext')).toBe('Order 1.0: 12.0 N m, major order')
  })

  it('a point is chosen by key as by pointer', () => {
    const chosen = vi.fn()
    render(
      <ScatterChart
        title="Layouts"
        sentence="Two layouts"
        x={{ name: 'Free force', unit: 'F2', format }}
        y={{ name: 'Counterweight', unit: '', format }}
        points={[
          { name: 'one', x: 0, y: 1, shape: 'dot' },
          { name: 'other', x: 4, y: 0.5, shape: 'ring' },
        ]}
        shapes={{ dot: 'even', ring: 'uneven' }}
        onChoose={chosen}
      />,
    )
    const reading = screen.getByRole('slider', { name: 'Layouts' })
    fireEvent.keyDown(reading, { key: 'End' })
    fireEvent.keyDown(reading, { key: 'Enter' })
    expect(chosen).toHaveBeenCalledWith(1)
  })
})

describe('<DataTable>', () => {
  const table = {
    title: 'Mains',
    columns: [
      { name: 'Main', unit: '' },
      { name: 'Most', unit: 'kN', decimals: 1 },
    ],
    rows: [
      ['M1', 12.34],
      ['M2', -3],
      ['M10', 7],
    ],
  }
  const firstColumn = () =>
    screen
      .getAllByRole('row')
      .slice(1)
      .map((row) => row.firstElementChild!.textContent)

  it('sorts by a column, numbers as numbers, and goes back to its own order', () => {
    render(<DataTable table={table} />)
    const head = screen.getByRole('button', { name: 'Most, kN' })
    fireEvent.click(head)
    expect(firstColumn()).toEqual(['M2', 'M10', 'M1'])
    fireEvent.click(head)
    expect(firstColumn()).toEqual(['M1', 'M10', 'M2'])
    fireEvent.click(head)
    expect(firstColumn()).toEqual(['M1', 'M2', 'M10'])
    expect(screen.getByText('\u22123.0')).toBeTruthy()
  })

  it('shows a page at a time', () => {
    render(<DataTable table={table} page={2} />)
    expect(firstColumn()).toEqual(['M1', 'M2'])
    fireEvent.click(screen.getByRole('button', { name: 'Later rows' }))
    expect(firstColumn()).toEqual(['M10'])
  })
})
