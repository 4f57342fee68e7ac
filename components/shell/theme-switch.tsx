'use client'

import { useSyncExternalStore } from 'react'
import { onThemeChange, readTheme, writeTheme, type Theme } from './theme'

const next: Record<Theme, Theme> = { system: 'light', light: 'dark', dark: 'system' }
const words: Record<Theme, string> = { system: 'paper: system', light: 'paper: vellum', dark: 'paper: slate' }

/** Quiet in the foot of the sheet: vellum, slate, or as the system has it. */
export function ThemeSwitch() {
  const theme = useSyncExternalStore(onThemeChange, readTheme, () => 'system' as const)
  return (
    <button type="button" className="paper-switch" onClick={() => writeTheme(next[theme])}>
      {words[theme]}
    </button>
  )
}
