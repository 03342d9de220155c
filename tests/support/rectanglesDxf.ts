/** A drawing of rectangles, each [x, y, width, height], as closed polylines in mm. */
export function rectanglesDxf(...rectangles: [number, number, number, number][]): string {
  const lines = ['0', 'SECTION', '2', 'HEADER', '9', '$ACADVER', '1', 'AC1015', '9', '$INSUNITS', '70', '4', '0', 'ENDSEC']
  lines.push('0', 'SECTION', '2', 'ENTITIES')
  for (const [x, y, w, h] of rectangles) {
    lines.push('0', 'LWPOLYLINE', '8', '0', '90', '4', '70', '1')
    for (const [px, py] of [
      [x, y],
      [x + w, y],
      [x + w, y + h],
      [x, y + h],
    ])
      lines.push('10', String(px), '20', String(py))
  }
  return `${[...lines, '0', 'ENDSEC', '0', 'EOF'].join('\n')}\n`
}
