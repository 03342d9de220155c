'use client'
import dynamic from 'next/dynamic'
import { useState } from 'react'
import { useMaterials } from '@/components/people/materials'
import { PageHead } from '@/components/shell/PageHead'
import { Button } from '@/components/ui/Button'
import type { Job } from '@/lib/api/schemas/job'
import { titleOf } from './titleOf'
import type { UploadFlow as Flow } from './UploadFlow'

const waiting = () => <div className="min-h-72 border border-hair bg-sheet" />
const DropZone = dynamic(() => import('./DropZone').then((module) => module.DropZone), { ssr: false, loading: waiting })
const UploadFlow = dynamic<React.ComponentProps<typeof Flow>>(() => import('./UploadFlow').then((module) => module.UploadFlow), {
  ssr: false,
  loading: waiting,
})

/** Several drawings at once: each file becomes a profile of the job, or several from one sheet. */
export function JobUploadPage({ job }: { job: Job }) {
  const [files, setFiles] = useState<File[]>([])
  const [at, setAt] = useState(0)
  const [opened, setOpened] = useState<ReadonlySet<number>>(new Set([0]))
  const [saved, setSaved] = useState<ReadonlySet<number>>(new Set())
  const materials = useMaterials().data
  const open = (i: number) => {
    setAt(i)
    setOpened(new Set([...opened, i]))
  }
  return (
    <>
      <PageHead number={job.number} title="New profiles from drawings" beside={<span className="text-soft">{job.title}</span>} />
      {files.length === 0 || !materials ? (
        <DropZone several onFiles={setFiles} />
      ) : (
        <>
          {files.length > 1 && (
            <nav aria-label="Files" className="flex flex-wrap gap-2 pb-3">
              {files.map((file, i) => (
                <Button
                  key={`${file.name} ${file.lastModified}`}
                  aria-current={i === at ? 'true' : undefined}
                  aria-pressed={i === at}
                  onClick={() => open(i)}
                >
                  {file.name}
                  {saved.has(i) && <span className="text-moss">saved</span>}
                </Button>
              ))}
            </nav>
          )}
          {files.map((file, i) => (
            <div key={`${file.name} ${file.lastModified}`} hidden={i !== at}>
              {opened.has(i) && (
                <UploadFlow
                  file={file}
                  active={i === at}
                  first={{ kind: 'new', jobId: job.id, title: titleOf(file.name), materialId: null }}
                  materials={materials}
                  onOther={() => setFiles([])}
                  onSaved={() => setSaved(new Set([...saved, i]))}
                />
              )}
            </div>
          ))}
        </>
      )}
    </>
  )
}
