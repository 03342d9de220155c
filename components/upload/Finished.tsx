'use client'
import { Check, Choices } from '@/components/ui/Check'
import type { FlowAction } from './flow/flow'
import { NumberChoice } from './NumberChoice'

/** Whether the finished profile is drawn or its die, whose shrinkage is undone and recorded. */
export function Finished({
  finished,
  shrinkage,
  dispatch,
}: {
  finished: 'finished' | 'die' | null
  shrinkage: number
  dispatch: (action: FlowAction) => void
}) {
  return (
    <Choices legend="What is drawn?" className="mt-3">
      <Check
        type="radio"
        name="finished"
        label="The finished profile"
        checked={finished === 'finished'}
        onChange={() => dispatch({ type: 'finished', finished: 'finished' })}
      />
      <Check
        type="radio"
        name="finished"
        label="The die, larger by its shrinkage"
        checked={finished === 'die'}
        onChange={() => dispatch({ type: 'finished', finished: 'die' })}
      />
      {finished === 'die' && (
        <NumberChoice
          label="Shrinkage"
          unit="%"
          hint="Undone and recorded: 1.2 % makes the profile 1.012 times smaller than the die."
          value={Number(((shrinkage - 1) * 100).toPrecision(10))}
          allow={(percent) => percent >= 0 && percent < 100}
          onChoose={(percent) => dispatch({ type: 'finished', finished: 'die', shrinkage: 1 + percent / 100 })}
        />
      )}
    </Choices>
  )
}
