import '@fontsource-variable/atkinson-hyperlegible-mono/index.css'
import '@fontsource-variable/atkinson-hyperlegible-next/index.css'
import './globals.css'
import type { Metadata, Viewport } from 'next'
import { cookies } from 'next/headers'
import type { ReactNode } from 'react'
import { THEME_COOKIE, themeOf } from '@/components/shell/theme'
import { DARK, LIGHT } from '@/tailwind.config'

export const metadata: Metadata = {
  title: { default: 'Sectionwright', template: '%s · Sectionwright' },
  description: 'From a drawing to a section people may rely on.',
}
export const viewport: Viewport = {
  themeColor: [
    { media: '(prefers-color-scheme: light)', color: LIGHT.paper },
    { media: '(prefers-color-scheme: dark)', color: DARK.paper },
  ],
}

export default async function RootLayout({ children }: { children: ReactNode }) {
  const theme = themeOf((await cookies()).get(THEME_COOKIE)?.value)
  return (
    <html lang="en" data-theme={theme === 'system' ? undefined : theme} suppressHydrationWarning>
      <body>{children}</body>
    </html>
  )
}
