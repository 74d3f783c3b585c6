'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useRouter } from 'next/navigation'
import type { ReactNode } from 'react'
import { Controller, useForm } from 'react-hook-form'
import type { z } from 'zod'
import { houseRulesSchema, type FullHouseRules } from '@/lib/rules/house-rules'
import type { Blinding } from '@/lib/rules/words'
import { useAction, type Answer } from '../shell/use-action'
import { Button } from '../ui/button'
import { Checkbox, RadioGroup } from '../ui/choice'
import { Field, Input, Textarea } from '../ui/field'
import { Notice } from '../ui/notice'
import { toast } from '../ui/toast'
import type { ProcedureOption } from './list-procedures'
import { ProcedureChoice } from './procedure-choice'

type Given = z.input<typeof houseRulesSchema>

type HouseRulesFormProps = {
  rules: FullHouseRules
  procedures: readonly ProcedureOption[]
  /** Left out where the viewer may read only. */
  save?: (input: FullHouseRules) => Promise<Answer<{ version: number }>>
}

const blindings: readonly { value: Blinding; label: string; hint: string }[] = [
  { value: 'single', label: 'Single', hint: 'Authors do not see who reviews.' },
  {
    value: 'double',
    label: 'Double',
    hint: 'Reviewers do not see who wrote either: no names, addresses or file names.',
  },
  { value: 'open', label: 'Open', hint: 'Both see each other.' },
]

/** What the house decides. Saving makes a new version; rounds keep the version of their day. */
export function HouseRulesForm({ rules, procedures, save }: HouseRulesFormProps) {
  const router = useRouter()
  const form = useForm<Given, unknown, FullHouseRules>({
    resolver: zodResolver(houseRulesSchema),
    defaultValues: rules,
  })
  const { run, pending, message, fields } = useAction(save ?? refuseQuietly, ({ version }) => {
    toast.success(`Version ${version} is in force for what is handed in from now on.`)
    form.reset(form.getValues())
    router.refresh()
  })
  const error = (field: keyof FullHouseRules) => form.formState.errors[field]?.message ?? fields[field]
  const submit = form.handleSubmit((input) => run(input))
  const { control } = form
  // The values stand in the server's page too, so that nothing is empty before the script has come.
  const register = (
    field: 'alpha' | 'correctionFrom' | 'reviewDays' | 'answerDays' | 'greeting' | 'closing',
  ) => ({
    ...form.register(field),
    defaultValue: rules[field],
  })
  const registerBox = (field: 'secondaryApart' | 'submitterSeesAudit' | 'twoPersonRelease') => ({
    ...form.register(field),
    defaultChecked: rules[field],
  })

  return (
    <form noValidate onSubmit={(event) => void submit(event)}>
      {message ? (
        <Notice tone="trouble" className="mb-5">
          {message}
        </Notice>
      ) : null}
      <fieldset disabled={!save} className="contents">
        <Part title="The audit">
          <Field
            label="Significance level (alpha)"
            hint="Where a manuscript states none."
            error={error('alpha') && 'Please give a number between 0 and 1, such as 0.05.'}
            className="max-w-56"
          >
            <Input inputMode="decimal" {...register('alpha')} />
          </Field>
          <Field
            label="A correction is called for from this many tests"
            hint="From 2 to 1000 tests of one family."
            error={error('correctionFrom') && 'Please give a whole number from 2 to 1000.'}
            className="max-w-72"
          >
            <Input inputMode="numeric" className="max-w-32" {...register('correctionFrom')} />
          </Field>
          <Checkbox
            label="Primary and secondary outcomes are separate families"
            {...registerBox('secondaryApart')}
          />
          <Controller
            control={control}
            name="accepted"
            render={({ field }) => (
              <ProcedureChoice
                options={procedures}
                value={field.value}
                onChange={field.onChange}
                error={error('accepted') && 'Please accept at least one procedure.'}
              />
            )}
          />
        </Part>
        <Part title="The review">
          <Controller
            control={control}
            name="blinding"
            render={({ field }) => (
              <RadioGroup
                legend="Blinding"
                name="blinding"
                options={blindings}
                value={field.value}
                onChange={field.onChange}
              />
            )}
          />
          <Checkbox
            label="Submitters see the audit before the verdict"
            hint="Without it they see its progress and then the letter."
            {...registerBox('submitterSeesAudit')}
          />
          <Checkbox
            label="A verdict takes two people"
            hint="The reviewer drafts it, an editor releases it."
            {...registerBox('twoPersonRelease')}
          />
          <div className="flex flex-wrap gap-6">
            <Field label="Days for a review" error={error('reviewDays') && 'From 1 to 365 days.'}>
              <Input inputMode="numeric" className="max-w-32" {...register('reviewDays')} />
            </Field>
            <Field label="Days for an answer" error={error('answerDays') && 'From 1 to 365 days.'}>
              <Input inputMode="numeric" className="max-w-32" {...register('answerDays')} />
            </Field>
          </div>
        </Part>
        <Part title="The letter">
          <Field
            label="Opening"
            hint="The first paragraph of every letter, at most 500 characters."
            error={error('greeting') && 'Please give an opening of at most 500 characters.'}
          >
            <Textarea rows={3} className="font-serif text-base" {...register('greeting')} />
          </Field>
          <Field
            label="Closing"
            hint="The last paragraph, at most 1000 characters."
            error={error('closing') && 'Please give a closing of at most 1000 characters.'}
          >
            <Textarea rows={5} className="font-serif text-base" {...register('closing')} />
          </Field>
        </Part>
      </fieldset>
      {save ? (
        <div className="flex items-center gap-4">
          <Button
            type="submit"
            variant="primary"
            disabled={!form.formState.isDirty}
            busy={pending && 'Saving…'}
          >
            Put into force
          </Button>
          <p className="text-ink-soft">
            {form.formState.isDirty ? 'Not saved yet.' : 'Nothing is changed.'} Rounds that were handed in
            before keep their version.
          </p>
        </div>
      ) : null}
    </form>
  )
}

const refuseQuietly = (): Promise<Answer<{ version: number }>> =>
  Promise.resolve({ ok: false, message: 'You may read these rules only.', fields: {} })

function Part({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section className="grid gap-x-8 gap-y-3 border-t border-rule py-6 md:grid-cols-[8rem_minmax(0,1fr)]">
      <h2 className="text-lg font-semibold">{title}</h2>
      <div className="flex flex-col gap-4">{children}</div>
    </section>
  )
}
