/** Handles below this belong to the frame of the document. */
export const FIRST_HANDLE = 0x100

/** Collects groups as text, and hands out handles. */
export class GroupWriter {
  private readonly lines: string[] = []
  handle = FIRST_HANDLE

  put(code: number, value: string | number): this {
    this.lines.push(String(code), String(value))
    return this
  }

  /** A real number: shortest text that reads back to the same double, with a decimal point or exponent. */
  real(code: number, value: number): this {
    const text = String(value === 0 ? 0 : value)
    return this.put(code, /[.e]/.test(text) ? text : `${text}.0`)
  }

  point(code: number, x: number, y: number): this {
    return this.real(code, x)
      .real(code + 10, y)
      .real(code + 20, 0)
  }

  /** Begins an entity in model space. */
  entity(kind: string, layer: string, subclass: string): this {
    const handle = (this.handle++).toString(16).toUpperCase()
    return this.put(0, kind).put(5, handle).put(330, '1F').put(100, 'AcDbEntity').put(8, layer).put(100, subclass)
  }

  text(): string {
    return this.lines.length > 0 ? `${this.lines.join('\n')}\n` : ''
  }
}
