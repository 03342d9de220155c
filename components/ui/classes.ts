/** Joins class names, leaving out what is empty. */
export const classes = (...names: (string | false | null | undefined)[]) => names.filter(Boolean).join(' ')
