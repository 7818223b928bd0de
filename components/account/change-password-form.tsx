'use client';

import type { Action } from '@/components/forms/action-result';
import { FormErrorSummary } from '@/components/forms/form-error-summary';
import { useActionForm } from '@/components/forms/use-action-form';
import { Button } from '@/components/ui/button';
import { TextField } from '@/components/ui/field';
import { passwordLength } from '@/services/people/rules';
import { ChangePassword } from '@/services/people/schemas';
import { loadAnew } from './enter';

export function ChangePasswordForm(props: {
  kind: 'staff' | 'customer';
  email: string;
  hasPassword: boolean;
  onChange: Action<ChangePassword, { email: string }>;
}) {
  const { kind, email, hasPassword, onChange } = props;
  const { field, submit, pending, summary, problem, done } = useActionForm({
    schema: ChangePassword,
    action: onChange,
    defaultValues: { current: '', next: '' },
    // The change ended this session too.
    onDone: () => loadAnew('/sign-in?changed=1'),
  });
  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid gap-4">
      <FormErrorSummary summary={summary} problem={problem} />
      <input type="hidden" name="username" autoComplete="username" value={email} readOnly />
      {hasPassword && (
        <TextField label="Password of now" type="password" autoComplete="current-password" {...field('current')} />
      )}
      <TextField
        label="New password"
        hint={`At least ${passwordLength[kind]} characters. Four odd words do well.`}
        type="password"
        autoComplete="new-password"
        {...field('next')}
      />
      <div>
        <Button type="submit" pending={pending || done > 0} pendingLabel="Changing it">
          {hasPassword ? 'Change the password' : 'Set a password'}
        </Button>
      </div>
    </form>
  );
}
