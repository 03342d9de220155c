/** A plate full of slots with so many edges, half of them arcs: LWPOLYLINEs of two lines and two half circles, as DXF text. */
export function plateOf(edges) {
  const slots = Math.floor((edges - 4) / 4)
  const columns = Math.ceil(Math.sqrt(slots))
  const rows = Math.ceil(slots / columns)
  const pitch = 10
  const lines = ['0', 'SECTION', '2', 'HEADER', '9', '$ACADVER', '1', 'AC1015', '9', '$INSUNITS', '70', '4', '0', 'ENDSEC']
  lines.push('0', 'SECTION', '2', 'ENTITIES')
  const closed = (points) => {
    lines.push('0', 'LWPOLYLINE', '8', 'PROFILE', '90', String(points.length), '70', '1')
    for (const [x, y, bulge] of points) lines.push('10', String(x), '20', String(y), '42', String(bulge))
  }
  const [width, height] = [columns * pitch, rows * pitch]
  closed([
    [0, 0, 0],
    [width, 0, 0],
    [width, height, 0],
    [0, height, 0],
  ])
  for (let k = 0; k < slots; k++) {
    const x = (k % columns) * pitch + 3
    const y = Math.floor(k / columns) * pitch + 3
    closed([
      [x, y, 0],
      [x + 4, y, 1],
      [x + 4, y + 4, 0],
      [x, y + 4, 1],
    ])
  }
  lines.push('0', 'ENDSEC', '0', 'EOF', '')
  return lines.join('\n')
}
