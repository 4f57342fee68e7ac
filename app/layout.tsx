import type { Metadata, Viewport } from 'next'
import localFont from 'next/font/local'
import type { ReactNode } from 'react'
import { themeScript } from '@/components/shell/theme'
import './globals.css'

const head = localFont({
  src: '../public/fonts/bricolage-grotesque-latin.woff2',
  weight: '200 800',
  declarations: [{ prop: 'font-stretch', value: '75% 100%' }],
  variable: '--face-head',
})
const text = localFont({
  src: '../public/fonts/instrument-sans-latin.woff2',
  weight: '400 700',
  variable: '--face-text',
})
const figures = localFont({
  src: '../public/fonts/spline-sans-mono-latin.woff2',
  weight: '300 700',
  variable: '--face-fig',
})

export const metadata: Metadata = {
  title: { default: 'Counterthrow', template: '%s · Counterthrow' },
  description: 'Crank trains described once, run in front of everyone, and shared as a link.',
}

export const viewport: Viewport = { width: 'device-width', initialScale: 1 }

export default function RootLayout({ children }: { children: ReactNode }) {
  return (
    <html
      lang="en"
      className={`${head.variable} ${text.variable} ${figures.variable}`}
      suppressHydrationWarning
    >
      <head>
        <script dangerouslySetInnerHTML={{ __html: themeScript }} />
      </head>
      <body>{children}</body>
    </html>
  )
}
