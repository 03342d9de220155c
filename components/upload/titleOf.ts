/** A title to start with, from the file's name: words instead of underscores, no ending. */
export const titleOf = (fileName: string) =>
  fileName
    .replace(/\.dxf$/i, '')
    .replace(/[_-]+/g, ' ')
    .trim()
