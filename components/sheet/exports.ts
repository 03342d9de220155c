import { toast } from '@/components/ui/toastStore'
import { request } from '@/lib/api/client'
import { keys } from '@/lib/api/keys'

/** Hands the person what the server sends, under a name of our own. */
async function save(path: string, name: string): Promise<void> {
  const link = document.createElement('a')
  link.href = URL.createObjectURL(await (await request(path)).blob())
  link.download = name
  link.click()
  URL.revokeObjectURL(link.href)
}

/** Twice the picture's own size, so that it prints well. */
const SHARPNESS = 2

async function savePng(revisionId: string, name: string): Promise<void> {
  const svg = await (await request(keys.picture(revisionId))).blob()
  const url = URL.createObjectURL(new Blob([svg], { type: 'image/svg+xml' }))
  try {
    const image = new Image()
    image.src = url
    await image.decode()
    const canvas = document.createElement('canvas')
    canvas.width = SHARPNESS * image.naturalWidth
    canvas.height = SHARPNESS * image.naturalHeight
    canvas.getContext('2d')?.drawImage(image, 0, 0, canvas.width, canvas.height)
    const png = await new Promise<Blob | null>((done) => canvas.toBlob(done, 'image/png'))
    if (!png) throw new Error('This browser could not make the PNG. Take the SVG.')
    const link = document.createElement('a')
    link.href = URL.createObjectURL(png)
    link.download = name
    link.click()
    URL.revokeObjectURL(link.href)
  } finally {
    URL.revokeObjectURL(url)
  }
}

const said = (work: Promise<void>) =>
  work.catch((error: unknown) => toast(error instanceof Error ? error.message : 'The file could not be made.', { tone: 'error' }))

/** All that leaves the product for one revision. */
export function exportsOf(revisionId: string, stem: string, fileName: string): { label: string; onChoose: () => void }[] {
  const row = (label: string, path: string, name: string) => ({ label, onChoose: () => void said(save(path, name)) })
  return [
    row('Figures as CSV', keys.figuresCsv(revisionId), `${stem}.csv`),
    row('Section as JSON', keys.section(revisionId), `${stem}.json`),
    row('Picture as SVG', keys.picture(revisionId), `${stem}.svg`),
    { label: 'Picture as PNG', onChoose: () => void said(savePng(revisionId, `${stem}.png`)) },
    row('Clean region as DXF', keys.regionDxf(revisionId), `${stem}-region.dxf`),
    row('Source file, as uploaded', keys.file(revisionId), fileName),
  ]
}
