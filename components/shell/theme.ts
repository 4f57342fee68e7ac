export type Theme = 'light' | 'dark' | 'system'

const KEY = 'counterthrow.theme'

/** Runs before the first paint, so that a chosen theme never flashes the other one. Without a choice the system's holds. */
export const themeScript = `try{var t=localStorage.getItem('${KEY}');if(t==='light'||t==='dark')document.documentElement.dataset.theme=t}catch(e){}`

export function readTheme(): Theme {
  const set = document.documentElement.dataset.theme
  return set === 'light' || set === 'dark' ? set : 'system'
}

export function writeTheme(theme: Theme): void {
  if (theme === 'system') delete document.documentElement.dataset.theme
  else document.documentElement.dataset.theme = theme
  try {
    if (theme === 'system') localStorage.removeItem(KEY)
    else localStorage.setItem(KEY, theme)
  } catch {
    // Storage may be closed to us; the theme then lasts as long as the page.
  }
  for (const listener of listeners) listener()
}

const listeners = new Set<() => void>()

/** Told when the paper changes colour, by hand or by the system. */
export function onThemeChange(listener: () => void): () => void {
  const system = window.matchMedia('(prefers-color-scheme: dark)')
  listeners.add(listener)
  system.addEventListener('change', listener)
  return () => {
    listeners.delete(listener)
    system.removeEventListener('change', listener)
  }
}
