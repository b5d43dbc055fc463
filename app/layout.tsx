import type { Metadata, Viewport } from 'next'
import { cookies } from 'next/headers'
import type { ReactNode } from 'react'
import { themeCookie, themeOf } from './_ui/shell/theme'
import './globals.css'

export const metadata: Metadata = {
  title: { template: '%s · Ledgerline', default: 'Ledgerline' },
  description: 'The quality ledger of a string works.',
  robots: { index: false, follow: false },
}

export const viewport: Viewport = { width: 'device-width', initialScale: 1 }

/** The theme and nothing else; what a room needs comes with the room. */
export default async function RootLayout({ children }: { readonly children: ReactNode }) {
  const theme = themeOf((await cookies()).get(themeCookie)?.value)
  return (
    <html lang="en" data-theme={theme === 'system' ? undefined : theme}>
      <body>{children}</body>
    </html>
  )
}
