'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useForm } from 'react-hook-form'
import { z } from 'zod'
import { ROLES, type Role } from '@/lib/rules/roles'
import { useAction, type Answer } from '../shell/use-action'
import { Button } from '../ui/button'
import { Checkbox } from '../ui/choice'
import { Dialog } from '../ui/dialog'
import { Field, Input, Textarea } from '../ui/field'
import { Notice } from '../ui/notice'

const personForm = z.object({
  email: z.string().trim().pipe(z.email('Please give an e-mail address.')),
  name: z.string().trim().min(1, 'Please give a name.').max(200),
  affiliation: z.string().trim().max(300),
  expertise: z.string().trim().max(1000),
  roles: z.array(z.enum(ROLES)).min(1, 'Please choose at least one role.'),
})
export type PersonForm = z.infer<typeof personForm>

const roleHints: Record<Role, string> = {
  submitter: 'hands in manuscripts and answers',
  reviewer: 'judges what is assigned',
  editor: 'sees the docket, assigns, releases',
  administrator: 'accounts, mail, record; no manuscripts',
}

type PersonDialogProps = {
  title: string
  /** Left out for someone who is not there yet. */
  person?: PersonForm
  verb: string
  save: (input: PersonForm) => Promise<Answer<unknown>>
  onClose: () => void
  onDone: () => void
}

/** Invites someone, or changes who they are and what they may do. The address of an account does not change. */
export function PersonDialog({ title, person, verb, save, onClose, onDone }: PersonDialogProps) {
  const form = useForm<PersonForm>({
    resolver: zodResolver(personForm),
    defaultValues: person ?? { email: '', name: '', affiliation: '', expertise: '', roles: [] },
  })
  const { run, pending, message, fields } = useAction(save, () => {
    onDone()
    onClose()
  })
  const { errors } = form.formState
  const submit = form.handleSubmit((input) => run(input))
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={title}
      footer={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button type="submit" form="person" variant="primary" busy={pending && 'Saving…'}>
            {verb}
          </Button>
        </>
      }
    >
      <form id="person" noValidate onSubmit={(event) => void submit(event)} className="flex flex-col gap-4">
        {message ? <Notice tone="trouble">{message}</Notice> : null}
        <Field label="E-mail address" error={errors.email?.message ?? fields.email}>
          <Input type="email" readOnly={person !== undefined} {...form.register('email')} />
        </Field>
        <Field label="Name" error={errors.name?.message ?? fields.name}>
          <Input {...form.register('name')} />
        </Field>
        <fieldset aria-describedby={errors.roles ? 'roles-error' : undefined}>
          <legend className="mb-1 font-medium">Roles</legend>
          <div className="grid gap-2 sm:grid-cols-2">
            {ROLES.map((role) => (
              <Checkbox
                key={role}
                label={role}
                hint={roleHints[role]}
                value={role}
                {...form.register('roles')}
              />
            ))}
          </div>
          {errors.roles ? (
            <p id="roles-error" className="mt-1 text-fails">
              {errors.roles.message}
            </p>
          ) : null}
        </fieldset>
        <Field label="Affiliation" optional error={errors.affiliation?.message}>
          <Input {...form.register('affiliation')} />
        </Field>
        <Field
          label="Expertise"
          optional
          hint="Editors see it when they assign."
          error={errors.expertise?.message}
        >
          <Textarea rows={2} {...form.register('expertise')} />
        </Field>
      </form>
    </Dialog>
  )
}
