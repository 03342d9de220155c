'use client'
import { Component, type ReactNode } from 'react'
import { Notice } from '@/components/ui/Notice'

/** Holds a fault of the picture, so that the figures beside it survive. */
export class BoardBoundary extends Component<{ requestId?: string; children: ReactNode }, { failed: boolean }> {
  override state = { failed: false }

  static getDerivedStateFromError() {
    return { failed: true }
  }

  override render() {
    if (!this.state.failed) return this.props.children
    return (
      <Notice tone="error" live>
        <p>
          <b>The picture could not be drawn.</b> The figures beside it are stored and stay right. Load the page again; the picture
          for printing is under Export.
        </p>
      </Notice>
    )
  }
}
