import type { Metadata, Viewport } from 'next'
import { cookies, headers } from 'next/headers'
import type { ReactNode } from 'react'
import { levelFont, workFont } from './fonts'
import { THEME_COOKIE, themeFrom } from './theme'
import './tokens.css'
import './global.css'

/** Every page is made per request: it needs the person, the theme and the policy's nonce. */
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
  const theme = themeFrom((await cookies()).get(THEME_COOKIE)?.value)
  // Next gives the nonce of the request's policy header to its own scripts; this is for those of other libraries.
  const nonce = (await headers()).get('x-nonce') ?? undefined
  return (
    <html lang="en" data-theme={theme} className={`${workFont.variable} ${levelFont.variable}`}>
      <head>{nonce && <meta property="csp-nonce" nonce={nonce} />}</head>
      <body>{children}</body>
    </html>
  )
}
