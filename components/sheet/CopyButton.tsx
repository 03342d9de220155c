'use client'
import { useState } from 'react'
import { copyText } from './copyText'

/** Copies a text; says so where it was pressed. */
export function CopyButton({ text, name, word = 'Copy' }: { text: string; name: string; word?: string }) {
  const [said, setSaid] = useState<string | null>(null)
  const copy = async () => {
    setSaid((await copyText(text)) ? 'Copied' : 'Press Ctrl+C')
    setTimeout(() => setSaid(null), 1600)
  }
  return (
    <button
      type="button"
      title={name}
      aria-label={said ?? name}
      onClick={copy}
      className="min-h-7 rounded border border-transparent px-1.5 text-small max-md:min-h-12 text-soft hover:border-hair hover:text-ink"
    >
      {said ?? word}
    </button>
  )
}
