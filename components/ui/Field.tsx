import { type ComponentProps, type ReactNode, useId } from 'react'
import { classes } from './classes'

interface Own {
  label: ReactNode
  /** shown inside the field, at its right */
  unit?: ReactNode
  hint?: ReactNode
  error?: ReactNode
  /** keeps the label for screen readers only */
  quietLabel?: boolean
}

export const controlClass = (bad: boolean) =>
  classes('target w-full rounded border bg-field px-3 py-1 text-ink', bad ? 'border-brick' : 'border-edge')

export function FieldFrame({ id, label, hint, error, quietLabel, children }: Own & { id: string; children: ReactNode }) {
  return (
    <div className="grid content-start gap-1">
      <label htmlFor={id} className={quietLabel ? 'sr-only' : 'text-small font-semibold'}>
        {label}
      </label>
      {children}
      {hint && !error && (
        <p id={`${id}-note`} className="text-small text-soft">
          {hint}
        </p>
      )}
      {error && (
        <p id={`${id}-note`} className="text-small text-brick">
          {error}
        </p>
      )}
    </div>
  )
}

/** A labelled text field. The unit stands in the field; hint and error are tied to it for screen readers. */
export function Field({ label, unit, hint, error, quietLabel, className, ...rest }: Own & ComponentProps<'input'>) {
  const made = useId()
  const id = rest.id ?? made
  return (
    <FieldFrame {...{ id, label, hint, error, quietLabel }}>
      <div className="relative">
        <input
          {...rest}
          id={id}
          aria-invalid={error ? true : undefined}
          aria-describedby={hint || error ? `${id}-note` : undefined}
          className={classes(controlClass(Boolean(error)), unit ? 'pr-14' : '', className)}
        />
        {unit && (
          <span className="pointer-events-none absolute inset-y-0 right-3 flex items-center text-soft" aria-hidden="true">
            {unit}
          </span>
        )}
      </div>
    </FieldFrame>
  )
}

export function TextArea({ label, hint, error, quietLabel, className, ...rest }: Omit<Own, 'unit'> & ComponentProps<'textarea'>) {
  const made = useId()
  const id = rest.id ?? made
  return (
    <FieldFrame {...{ id, label, hint, error, quietLabel }}>
      <textarea
        rows={3}
        {...rest}
        id={id}
        aria-invalid={error ? true : undefined}
        aria-describedby={hint || error ? `${id}-note` : undefined}
        className={classes(controlClass(Boolean(error)), 'py-2', className)}
      />
    </FieldFrame>
  )
}

export function Select({
  label,
  hint,
  error,
  quietLabel,
  className,
  children,
  ...rest
}: Omit<Own, 'unit'> & ComponentProps<'select'>) {
  const made = useId()
  const id = rest.id ?? made
  return (
    <FieldFrame {...{ id, label, hint, error, quietLabel }}>
      <select
        {...rest}
        id={id}
        aria-invalid={error ? true : undefined}
        aria-describedby={hint || error ? `${id}-note` : undefined}
        className={classes(controlClass(Boolean(error)), className)}
      >
        {children}
      </select>
    </FieldFrame>
  )
}
