/** Is it XML with matching tags and quoted attributes? A small check of our own: elements, attributes, text, entities. */
export function wellFormed(xml: string): boolean {
  const open: string[] = []
  let rest = xml
  while (rest.length > 0) {
    const text = /^[^<&]+|^&(amp|lt|gt|quot|#39);/.exec(rest)
    if (text) {
      rest = rest.slice(text[0].length)
      continue
    }
    const tag = /^<(\/?)([A-Za-z]+)((?: [A-Za-z-]+="(?:[^"<&]|&(?:amp|lt|gt|quot|#39);)*")*)(\/?)>/.exec(rest)
    if (!tag) return false
    if (tag[1]) {
      if (open.pop() !== tag[2]) return false
    } else if (!tag[4]) open.push(tag[2])
    rest = rest.slice(tag[0].length)
  }
  return open.length === 0
}
