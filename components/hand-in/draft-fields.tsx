'use client'

import type { UseFormReturn } from 'react-hook-form'
import { Field, Input, Textarea } from '../ui/field'
import { draftFieldLabels as labels, type DraftForm } from './draft-form'
import { Section } from './section'

/** What the reader needs to know beside the files. */
export function DraftFields({ form }: { form: UseFormReturn<DraftForm> }) {
  const { formState } = form
  // The value stands in the server's page too, so that nothing is empty before the script has come.
  const register = (field: keyof DraftForm) => ({
    ...form.register(field),
    defaultValue: formState.defaultValues?.[field],
  })
  const error = (field: keyof DraftForm) => formState.errors[field]?.message
  return (
    <>
      <Section number={2} title="The manuscript">
        <Field label={labels.title} required error={error('title')}>
          <Input {...register('title')} />
        </Field>
        <div className="grid gap-4 sm:grid-cols-2">
          <Field label={labels.correspondingAuthor} required error={error('correspondingAuthor')}>
            <Input {...register('correspondingAuthor')} />
          </Field>
          <Field
            label={labels.correspondingEmail}
            hint="The verdict's letter goes here too."
            required
            error={error('correspondingEmail')}
          >
            <Input type="email" {...register('correspondingEmail')} />
          </Field>
        </div>
      </Section>
      <Section number={3} title="The tests">
        <Field
          label={labels.correction}
          optional
          hint="As you would tell a colleague: which tests form a family, how many, by which procedure."
          error={error('correction')}
        >
          <Textarea rows={4} {...register('correction')} />
        </Field>
        <Field
          label={labels.alpha}
          optional
          hint="What the manuscript states; 0.05 where it states nothing."
          error={error('alpha')}
          className="max-w-56"
        >
          <Input inputMode="decimal" {...register('alpha')} />
        </Field>
        <Field label={labels.primaryOutcome} optional error={error('primaryOutcome')}>
          <Input {...register('primaryOutcome')} />
        </Field>
        <Field label={labels.note} optional error={error('note')}>
          <Textarea rows={3} {...register('note')} />
        </Field>
      </Section>
    </>
  )
}
