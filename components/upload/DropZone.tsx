'use client'
import { useEffect } from 'react'
import { useDropzone } from 'react-dropzone'
import { classes } from '@/components/ui/classes'

/** Takes drawings by drop, by paste and by click; the key O opens the file window. */
export function DropZone({ several = false, onFiles }: { several?: boolean; onFiles: (files: File[]) => void }) {
  const { getRootProps, getInputProps, isDragActive, open } = useDropzone({
    multiple: several,
    onDrop: (files) => files.length > 0 && onFiles(files),
    noClick: true,
    noKeyboard: true,
  })
  useEffect(() => {
    // what the first drawing needs is fetched while the person looks for it
    import('@/lib/jobs/browser-pool').then(({ warmPreview }) => warmPreview())
    import('./UploadFlow')
  }, [])
  useEffect(() => {
    const onPaste = (event: ClipboardEvent) => {
      const files = [...(event.clipboardData?.files ?? [])]
      if (files.length === 0) return
      event.preventDefault()
      onFiles(several ? files : files.slice(0, 1))
    }
    const onKey = (event: KeyboardEvent) => {
      const typing = event.target instanceof HTMLElement && event.target.closest('input, textarea, select, dialog')
      if (event.key.toLowerCase() === 'o' && !typing && !event.ctrlKey && !event.metaKey && !event.altKey) open()
    }
    document.addEventListener('paste', onPaste)
    document.addEventListener('keydown', onKey)
    return () => {
      document.removeEventListener('paste', onPaste)
      document.removeEventListener('keydown', onKey)
    }
  }, [onFiles, open, several])
  return (
    <div
      {...getRootProps()}
      className={classes(
        'grid min-h-72 place-content-center justify-items-center gap-3 border border-dashed px-6 py-12 text-center',
        isDragActive ? 'border-accent bg-wash' : 'border-edge bg-sheet',
      )}
    >
      <input {...getInputProps({ accept: '.dxf' })} style={undefined} aria-label="DXF file" className="sr-only" tabIndex={-1} />
      <p className="font-semibold text-lg">{several ? 'Drop one or several DXF files here' : 'Drop the DXF here'}</p>
      <p className="max-w-prose text-soft">
        It is read in your browser and shown before anything is saved. You can also paste a file, or
      </p>
      <button
        type="button"
        onClick={open}
        title="Choose a file (O)"
        aria-keyshortcuts="O"
        className="target rounded border border-accent bg-accent px-4 text-sheet"
      >
        {several ? 'Choose files' : 'Choose a file'}
      </button>
      <p className="text-small text-soft">DXF from R12 to 2018, text or binary, up to 64 MiB. Save a DWG as DXF first.</p>
    </div>
  )
}
