'use client';

import { FormErrorSummary } from '@/components/forms/form-error-summary';
import { useActionForm } from '@/components/forms/use-action-form';
import { Button } from '@/components/ui/button';
import { TextField } from '@/components/ui/field';
import { SignIn } from '@/services/people/schemas';
import { enter, goOn } from './enter';

/** Signs in with password and, for staff, the code of the moment. */
export function PasswordForm({ next }: { next: string | null }) {
  const { field, submit, pending, summary, problem, done } = useActionForm({
    schema: SignIn,
    action: ({ email, password, code }) => enter('password', { email, password, code }),
    defaultValues: { email: '', password: '', code: '' },
    onDone: () => goOn(next),
  });
  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid gap-4">
      <FormErrorSummary summary={summary} problem={problem} />
      <TextField label="E-mail" type="email" autoComplete="username" inputMode="email" {...field('email')} />
      <TextField label="Password" type="password" autoComplete="current-password" {...field('password')} />
      <TextField
        label="Code"
        hint="Staff only: the six figures of the moment. Customers leave it empty."
        inputMode="numeric"
        autoComplete="one-time-code"
        figures
        frameClassName="sm:max-w-60"
        {...field('code')}
      />
      <div>
        <Button type="submit" variant="primary" pending={pending || done > 0} pendingLabel="Signing in">
          Sign in
        </Button>
      </div>
    </form>
  );
}
