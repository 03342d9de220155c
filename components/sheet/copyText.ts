/**
 * Puts a text on the clipboard; also over plain http, where the page has no clipboard of its own and
 * a selected field is copied instead. False where the browser refuses both.
 */
export async function copyText(text: string): Promise<boolean> {
  if (navigator.clipboard && window.isSecureContext) {
    try {
      await navigator.clipboard.writeText(text)
      return true
    } catch {
      return copyFromField(text)
    }
  }
  return copyFromField(text)
}

function copyFromField(text: string): boolean {
  const field = document.createElement('textarea')
  field.value = text
  field.readOnly = true
  field.className = 'fixed top-0 left-0 opacity-0'
  document.body.append(field)
  const focused = document.activeElement
  field.select()
  const done = document.execCommand('copy')
  field.remove()
  if (focused instanceof HTMLElement) focused.focus()
  return done
}
