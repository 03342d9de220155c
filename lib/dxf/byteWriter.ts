/** Bytes that grow while they are written. */
export class ByteWriter {
  private bytes: Uint8Array
  private used = 0

  constructor(size: number) {
    this.bytes = new Uint8Array(Math.max(64, size))
  }

  byte(value: number): void {
    if (this.used === this.bytes.length) {
      const wider = new Uint8Array(2 * this.bytes.length)
      wider.set(this.bytes)
      this.bytes = wider
    }
    this.bytes[this.used++] = value
  }

  ascii(text: string): void {
    for (let i = 0; i < text.length; i++) this.byte(text.charCodeAt(i))
  }

  done(): Uint8Array {
    return this.bytes.subarray(0, this.used)
  }
}
