'use client'
import { Button } from '@/components/ui/Button'
import { Field, Select, TextArea } from '@/components/ui/Field'
import { Notice } from '@/components/ui/Notice'
import { ProblemNotice } from '@/components/ui/ProblemNotice'
import type { Problem } from '@/components/ui/problem'
import type { Material } from '@/lib/api/schemas/people'
import type { Choices, FlowAction, FlowState } from './flow/flow'
import type { Target } from './target'

/** The end of the flow: what goes beside the figures, what is still missing, and the one main action. */
export function SavePanel({
  state,
  choices,
  target,
  materials,
  missing,
  saving,
  problem,
  dispatch,
  onTitle,
  onSave,
  onCancel,
}: {
  state: FlowState
  choices: Choices
  target: Target
  materials: readonly Material[]
  /** what must come first, in words */
  missing: readonly string[]
  saving: boolean
  problem: Problem | null
  dispatch: (action: FlowAction) => void
  onTitle: (title: string) => void
  onSave: () => void
  onCancel: () => void
}) {
  return (
    <section aria-label="Save" className="grid gap-3 border-t border-hair pt-3">
      {target.kind === 'new' && (
        <Field
          label="Title of the profile"
          value={target.title}
          maxLength={160}
          onChange={(event) => onTitle(event.target.value)}
        />
      )}
      <Select
        label="Material"
        value={choices.recipe.material ?? ''}
        onChange={(event) => dispatch({ type: 'set', change: { material: event.target.value || null } })}
      >
        <option value="">Not chosen: no mass</option>
        {materials.map(({ id, name, density }) => (
          <option key={id} value={id}>
            {name} ({density} kg/m³)
          </option>
        ))}
      </Select>
      <div className="grid grid-cols-[8rem_minmax(0,1fr)] gap-3">
        <Field
          label="Drawing’s revision"
          value={state.drawingRevision}
          maxLength={40}
          onChange={(event) => dispatch({ type: 'text', change: { drawingRevision: event.target.value } })}
        />
        <TextArea
          label="Note"
          rows={1}
          value={state.note}
          maxLength={2000}
          onChange={(event) => dispatch({ type: 'text', change: { note: event.target.value } })}
        />
      </div>
      <ProblemNotice problem={problem}>
        {problem?.findings.map(({ code, message }) => (
          <p key={`${code} ${message}`} className="mt-1">
            {message}
          </p>
        ))}
      </ProblemNotice>
      {saving ? (
        <Notice tone="asked" live>
          <p>
            <b>Saving.</b> The server computes the section again from the stored file.
          </p>
          <Button onClick={onCancel}>Cancel</Button>
        </Notice>
      ) : (
        <div className="flex flex-wrap items-center gap-3">
          <Button look="main" shortcut="Control+S" title="Save the revision" disabled={missing.length > 0} onClick={onSave}>
            Save revision
          </Button>
          {missing.length > 0 && <p className="text-small text-soft">Once {listed(missing)}.</p>}
        </div>
      )}
    </section>
  )
}

const listed = (words: readonly string[]) =>
  words.length < 2 ? words.join('') : `${words.slice(0, -1).join(', ')} and ${words[words.length - 1]}`
