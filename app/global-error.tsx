'use client'
import './globals.css'
import { Fault } from '@/components/shell/Fault'

export default function GlobalError(fault: { error: Error & { digest?: string }; reset: () => void }) {
  return (
    <html lang="en">
      <body className="px-6">
        <Fault {...fault} />
      </body>
    </html>
  )
}
