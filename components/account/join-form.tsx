'use client';

import type { Action } from '@/components/forms/action-result';
import { FormErrorSummary } from '@/components/forms/form-error-summary';
import { useActionForm } from '@/components/forms/use-action-form';
import { Button } from '@/components/ui/button';
import { TextField } from '@/components/ui/field';
import { CreateAccount } from '@/services/people/schemas';
import { LookForMail } from './link-form';

/** Opens a customer's account: the mail that follows shows that the address is theirs. */
export function JoinForm({ onJoin }: { onJoin: Action<CreateAccount, { email: string }> }) {
  const { field, submit, pending, summary, problem, done } = useActionForm({
    schema: CreateAccount,
    action: onJoin,
    defaultValues: { name: '', email: '' },
  });
  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid gap-4">
      <FormErrorSummary summary={summary} problem={problem} />
      <TextField label="Name" hint="As it should stand on a packing slip." autoComplete="name" {...field('name')} />
      <TextField label="E-mail" type="email" autoComplete="email" inputMode="email" {...field('email')} />
      <div>
        <Button type="submit" variant="primary" pending={pending} pendingLabel="Opening the account">
          Open an account
        </Button>
      </div>
      {done > 0 && <LookForMail />}
    </form>
  );
}
