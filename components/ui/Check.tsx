import { type ComponentProps, type ReactNode, useId } from 'react'
import { classes } from './classes'

interface Own {
  label: ReactNode
  hint?: ReactNode
}

/** A checkbox or, with type="radio", one choice of several; the whole line is the target. */
export function Check({ label, hint, type = 'checkbox', className, ...rest }: Own & ComponentProps<'input'>) {
  const made = useId()
  const id = rest.id ?? made
  return (
    <div className={classes('flex', className)}>
      <label htmlFor={id} className="target flex flex-1 cursor-pointer items-center gap-3 py-1">
        <input
          {...rest}
          id={id}
          type={type}
          aria-describedby={hint ? `${id}-note` : undefined}
          className="size-5 shrink-0 accent-accent"
        />
        <span>
          {label}
          {hint && (
            <span id={`${id}-note`} className="block text-small text-soft">
              {hint}
            </span>
          )}
        </span>
      </label>
    </div>
  )
}

/** A group of checks or radios under one question. */
export function Choices({ legend, children, className }: { legend: ReactNode; children: ReactNode; className?: string }) {
  return (
    <fieldset className={className}>
      <legend className="text-small font-semibold">{legend}</legend>
      {children}
    </fieldset>
  )
}
