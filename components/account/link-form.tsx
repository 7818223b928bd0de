'use client';

import type { Action } from '@/components/forms/action-result';
import { FormErrorSummary } from '@/components/forms/form-error-summary';
import { useActionForm } from '@/components/forms/use-action-form';
import { Button } from '@/components/ui/button';
import { TextField } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { AskForLink } from '@/services/people/schemas';

/** Asks for a one-time link by mail. Says the same whether the address has an account or not. */
export function LinkForm({ onAsk }: { onAsk: Action<AskForLink, { email: string }> }) {
  const { field, submit, pending, summary, problem, done } = useActionForm({
    schema: AskForLink,
    action: onAsk,
    defaultValues: { email: '' },
  });
  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid gap-4">
      <FormErrorSummary summary={summary} problem={problem} />
      <TextField label="E-mail" type="email" autoComplete="email" inputMode="email" {...field('email')} />
      <div>
        <Button type="submit" pending={pending} pendingLabel="Asking">
          Mail me a link
        </Button>
      </div>
      {done > 0 && <LookForMail />}
    </form>
  );
}

export function LookForMail() {
  return (
    <Notice kind="info" title="A mail is on its way" live="status">
      Open it on this device within ten minutes: the link works once, in this browser. Nothing after a few minutes? Look
      among unwanted mail, or check the address.
    </Notice>
  );
}
