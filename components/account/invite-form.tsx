'use client';

import type { Action } from '@/components/forms/action-result';
import { FormErrorSummary } from '@/components/forms/form-error-summary';
import { useActionForm } from '@/components/forms/use-action-form';
import { Button } from '@/components/ui/button';
import { TextField } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { InviteStaff } from '@/services/people/schemas';
import { FreshCode } from './fresh-code';
import { RoleBoxes } from './role-boxes';

export function InviteForm(props: { needsCode: boolean; onInvite: Action<InviteStaff, { email: string }> }) {
  const { needsCode, onInvite } = props;
  const { form, field, submit, pending, summary, problem, done } = useActionForm({
    schema: InviteStaff,
    action: onInvite,
    defaultValues: { name: '', email: '', roles: [], code: '' },
    onDone: () => form.reset(),
  });
  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid gap-4">
      <FormErrorSummary summary={summary} problem={problem} />
      <TextField label="Name" autoComplete="off" {...field('name')} />
      <TextField label="E-mail" type="email" inputMode="email" autoComplete="off" {...field('email')} />
      <RoleBoxes {...field('roles')} />
      {needsCode && <FreshCode {...field('code')} />}
      <div>
        <Button type="submit" variant="primary" icon="letter" pending={pending} pendingLabel="Inviting">
          Send the invitation
        </Button>
      </div>
      {done > 0 && (
        <Notice kind="clears" title="The invitation is on its way" live="status">
          It works once, for a week. Until then it stands in the list.
        </Notice>
      )}
    </form>
  );
}
