import type { Metadata, Viewport } from 'next'
import type { ReactNode } from 'react'
import { levelFont, workFont } from './fonts'
import { chosenTheme } from './shell/theme'
import './tokens.css'
import './global.css'

/**
 * Every page is made per request: it needs the person and the theme, and Next puts the nonce of the request's own
 * content-security-policy header (lib/server sets it) on every script that it writes.
 */
export const dynamic = 'force-dynamic'

export const metadata: Metadata = {
  title: { default: 'Halfbaud', template: '%s · Halfbaud' },
  description: 'A shared worksheet for the loss budgets of high-speed serial links.',
  referrer: 'same-origin',
}

export const viewport: Viewport = {
  width: 'device-width',
  initialScale: 1,
  themeColor: [
    { media: '(prefers-color-scheme: light)', color: '#f0f3f1' },
    { media: '(prefers-color-scheme: dark)', color: '#151b25' },
  ],
}

export default async function RootLayout({ children }: { children: ReactNode }) {
  return (
    <html lang="en" data-theme={await chosenTheme()} className={`${workFont.variable} ${levelFont.variable}`}>
      <body>{children}</body>
    </html>
  )
}
