'use client';

import type { Action } from '@/components/forms/action-result';
import { FormErrorSummary } from '@/components/forms/form-error-summary';
import { useActionForm } from '@/components/forms/use-action-form';
import { Button } from '@/components/ui/button';
import { TextField } from '@/components/ui/field';
import { passwordLength } from '@/services/people/rules';
import { AcceptInvitation } from '@/services/people/schemas';
import { loadAnew } from './enter';

/** Password and second factor of somebody who was invited. */
export function EnrolmentForm(props: {
  token: string;
  email: string;
  onAccept: Action<AcceptInvitation, { email: string }>;
}) {
  const { token, email, onAccept } = props;
  const { field, submit, pending, summary, problem, done } = useActionForm({
    schema: AcceptInvitation,
    action: onAccept,
    defaultValues: { token, password: '', code: '' },
    onDone: () => loadAnew('/sign-in?joined=1'),
  });
  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid gap-4">
      <FormErrorSummary summary={summary} problem={problem} />
      <TextField label="E-mail" type="email" autoComplete="username" value={email} readOnly />
      <TextField
        label="Password"
        hint={`At least ${passwordLength.staff} characters. Four odd words do well; a password safe may fill it in.`}
        type="password"
        autoComplete="new-password"
        {...field('password')}
      />
      <TextField
        label="Code"
        hint="The six figures that your authenticator shows for Coilyard."
        inputMode="numeric"
        autoComplete="one-time-code"
        figures
        frameClassName="sm:max-w-60"
        {...field('code')}
      />
      <div>
        <Button type="submit" variant="primary" pending={pending || done > 0} pendingLabel="Setting it up">
          Set up my way in
        </Button>
      </div>
    </form>
  );
}
