import '@fontsource-variable/source-serif-4/opsz.css'
import '@fontsource-variable/source-serif-4/wght-italic.css'
import '@fontsource-variable/source-sans-3/wght.css'
import '@fontsource-variable/source-sans-3/wght-italic.css'
import '@fontsource-variable/source-code-pro/wght.css'
import './globals.css'
import type { Metadata, Viewport } from 'next'
import type { ReactNode } from 'react'
import { Providers } from '@/components/shell/providers'
import { getTheme } from '@/lib/web/theme'

export const metadata: Metadata = {
  title: { default: 'Assize', template: '%s · Assize' },
  description: 'Where manuscripts have their multiple-comparison corrections recomputed and judged.',
  icons: { icon: '/favicon.svg' },
}

export const viewport: Viewport = { width: 'device-width', initialScale: 1, colorScheme: 'light dark' }

export default async function RootLayout({ children }: { children: ReactNode }) {
  return (
    <html lang="en" data-theme={await getTheme()}>
      <body>
        <Providers>{children}</Providers>
      </body>
    </html>
  )
}
