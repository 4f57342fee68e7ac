// @vitest-environment happy-dom
import { describe, expect, it } from 'vitest'
import { createLabels } from '@/scene/stage/labels'

const sheet = { width: 800, height: 600, legend: { width: 0, height: 0 } }

describe('createLabels(layer)', () => {
  it('keeps words out of sight until a picture says where they stand', () => {
    const layer = document.createElement('div')
    const labels = createLabels(layer)
    const shown = () => [...layer.children].filter((word) => !(word as HTMLElement).hidden)
    labels.set([
      { text: 'free end', kind: 'plain' },
      { text: 'throw 1', kind: 'plain' },
    ])
    expect(layer.children).toHaveLength(2)
    expect(shown()).toEqual([])
    labels.begin(sheet)
    labels.put(1, 400, 300)
    labels.end()
    expect(shown().map(({ textContent }) => textContent)).toEqual(['throw 1'])
  })
})
