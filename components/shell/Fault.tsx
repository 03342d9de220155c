'use client'
import { Button, LinkButton } from '@/components/ui/Button'
import { Notice } from '@/components/ui/Notice'

/** A page that failed: what to do, and the id by which whoever runs the server finds the fault. */
export function Fault({ error, reset }: { error: Error & { digest?: string }; reset: () => void }) {
  return (
    <div className="max-w-xl py-8">
      <h1 className="font-semibold text-2xl tracking-tight">This page failed</h1>
      <Notice tone="error" live>
        <p>Nothing that was saved is lost. Try again; if it fails again, quote the id to whoever runs the server.</p>
        {error.digest && <p className="font-mono text-small">Request {error.digest}</p>}
      </Notice>
      <div className="flex gap-2">
        <Button look="main" onClick={reset}>
          Try again
        </Button>
        <LinkButton href="/">To the first page</LinkButton>
      </div>
    </div>
  )
}
