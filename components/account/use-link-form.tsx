'use client';

import { useState } from 'react';
import { FormErrorSummary } from '@/components/forms/form-error-summary';
import { useActionForm } from '@/components/forms/use-action-form';
import { Button } from '@/components/ui/button';
import { Checkbox } from '@/components/ui/checkbox';
import { TextLink } from '@/components/ui/link-button';
import { UseLink } from '@/services/people/schemas';
import { enter, goOn } from './enter';

/** Uses the link up at the press of the button, never by being opened: mail programs open links ahead of their reader. */
export function UseLinkForm({ token }: { token: string }) {
  const [used, setUsed] = useState(false);
  const { field, submit, pending, summary, problem } = useActionForm({
    schema: UseLink,
    action: (input) => enter('link', { token: input.token, forgetPassword: input.forgetPassword ? 'yes' : 'no' }),
    defaultValues: { token, forgetPassword: false },
    onDone: () => {
      setUsed(true);
      goOn(null);
    },
  });
  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid gap-4">
      <FormErrorSummary summary={summary} problem={problem} />
      <Checkbox
        label="I forgot my password"
        hint="Removes it, so that you can choose a new one under Account. Other browsers are signed out."
        {...field('forgetPassword')}
      />
      <div className="flex flex-wrap items-center gap-4">
        <Button type="submit" variant="primary" pending={pending || used} pendingLabel="Signing in">
          Sign in
        </Button>
        <TextLink href="/sign-in">Ask for a new link</TextLink>
      </div>
    </form>
  );
}
