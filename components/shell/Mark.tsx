/** The product's mark: an angle section and the line scribed on it. */
export function Mark() {
  return (
    <svg width="26" height="26" viewBox="0 0 26 26" aria-hidden="true" className="shrink-0">
      <path d="M6 2v17h16v4H2V2z" fill="none" stroke="currentColor" strokeWidth="1.6" strokeLinejoin="round" />
      <path d="M3.5 25 18 2" className="stroke-accent" strokeWidth="1.6" />
    </svg>
  )
}
