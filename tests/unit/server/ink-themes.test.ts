import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { inkThemes } from '@/lib/pictures/scene-picture'

const css = readFileSync('app/tokens.css', 'utf8')

describe('inkThemes', () => {
  it.each(['light', 'dark'] as const)('inkThemes.%s has the colours of app/tokens.css', (theme) => {
    const [block] = new RegExp(`\\[data-theme="${theme}"\\] \\{[^}]*\\}`).exec(css) ?? ['']
    for (const [name, colour] of Object.entries(inkThemes[theme])) {
      const token = name.replace(/[A-Z]/g, (letter) => `-${letter.toLowerCase()}`)
      const [, digits] = new RegExp(`--${token}: #([0-9A-F]{6});`).exec(block) ?? []
      expect(digits, token).toBe(colour.toString(16).padStart(6, '0').toUpperCase())
    }
  })
})
