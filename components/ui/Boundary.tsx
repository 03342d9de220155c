'use client'
import { Component, type ReactNode } from 'react'
import { Button } from './Button'
import { Notice } from './Notice'

interface Props {
  /** what failed, as a sentence's subject: 'The picture' */
  what: string
  children: ReactNode
}

/** A fault of a part of the page leaves the rest standing. */
export class Boundary extends Component<Props, { fault: string | null }> {
  override state: { fault: string | null } = { fault: null }

  static getDerivedStateFromError(error: unknown) {
    return { fault: error instanceof Error ? error.message : String(error) }
  }

  override render() {
    if (this.state.fault === null) return this.props.children
    return (
      <Notice tone="error" live>
        <p>
          <b>{this.props.what} failed.</b> Everything else on this page still holds.
        </p>
        <p className="text-small text-soft">{this.state.fault}</p>
        <Button onClick={() => this.setState({ fault: null })}>Try again</Button>
      </Notice>
    )
  }
}
