import type { Config } from 'tailwindcss'

// The tokens themselves are CSS variables (app/tokens.css), so that a theme is one attribute on <html>.
const token = (name: string) => `var(--${name})`

export default {
  content: ['./app/**/*.{ts,tsx}', './components/**/*.{ts,tsx}'],
  theme: {
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      ...Object.fromEntries(
        [
          'paper',
          'field',
          'tint',
          'part',
          'metal',
          'ink',
          'ink-2',
          'line',
          'hair',
          'on-ink',
          'fire',
          'gas',
          'gas-ink',
          'inertia',
          'res',
          'pencil',
          'pencil-wash',
        ].map((name) => [name, token(name)]),
      ),
    },
    fontFamily: { head: token('font-head'), text: token('font-text'), fig: token('font-fig') },
    borderRadius: { none: '0', full: '9999px' },
    boxShadow: {},
    spacing: { 0: '0', 1: '4px', 2: '8px', 3: '12px', 4: '16px', 5: '24px', 6: '32px', 7: '48px' },
    screens: { sm: '641px', md: '1024px', lg: '1280px', xl: '1381px' },
  },
} satisfies Config
