const ENTITIES: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' }

/** Text safe inside an XML element or attribute: markup escaped, what XML does not allow replaced by U+FFFD. */
export function xmlText(text: string): string {
  let safe = ''
  for (const character of text) {
    const code = character.codePointAt(0) ?? 0
    const surrogate = code >= 0xd800 && code <= 0xdfff
    const allowed = code >= 0x20 ? !surrogate && code !== 0xfffe && code !== 0xffff : code === 9 || code === 10 || code === 13
    safe += allowed ? (ENTITIES[character] ?? character) : '\ufffd'
  }
  return safe
}

export type Attributes = Record<string, string | number | undefined>

/** One XML element; `children` are markup already. */
export function element(name: string, attributes: Attributes, children = ''): string {
  const written = Object.entries(attributes)
    .filter(([, value]) => value !== undefined)
    .map(([key, value]) => ` ${key}="${xmlText(String(value))}"`)
    .join('')
  return children === '' ? `<${name}${written}/>` : `<${name}${written}>${children}</${name}>`
}
