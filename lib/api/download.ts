/** Headers of a download: saved, never shown in the page. RFC 6266 and RFC 8187 for the name. */
export function attachment(name: string, type: string): Record<string, string> {
  const ascii = name.replace(/[^\x20-\x7e]|["\\]/g, '_')
  const encoded = encodeURIComponent(name).replace(/['()*]/g, (c) => `%${c.charCodeAt(0).toString(16).toUpperCase()}`)
  return { 'content-type': type, 'content-disposition': `attachment; filename="${ascii}"; filename*=UTF-8''${encoded}` }
}

/** Bytes as a body, read only as fast as they are sent. */
export function streamOf(source: AsyncGenerator<Uint8Array<ArrayBuffer>>): ReadableStream<Uint8Array<ArrayBuffer>> {
  return new ReadableStream({
    async pull(controller) {
      const { done, value } = await source.next()
      if (done) controller.close()
      else controller.enqueue(value)
    },
    async cancel() {
      await source.return(undefined)
    },
  })
}
