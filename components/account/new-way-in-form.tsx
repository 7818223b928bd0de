'use client';

import type { Action } from '@/components/forms/action-result';
import { FormErrorSummary } from '@/components/forms/form-error-summary';
import { useActionForm } from '@/components/forms/use-action-form';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { SendNewWayIn } from '@/services/people/schemas';
import { FreshCode } from './fresh-code';

export function NewWayInForm(props: {
  personId: SendNewWayIn['personId'];
  needsCode: boolean;
  onSend: Action<SendNewWayIn, { email: string }>;
}) {
  const { personId, needsCode, onSend } = props;
  const { field, submit, pending, summary, problem, done } = useActionForm({
    schema: SendNewWayIn,
    action: onSend,
    defaultValues: { personId, code: '' },
  });
  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid gap-4">
      <FormErrorSummary summary={summary} problem={problem} />
      {needsCode && <FreshCode {...field('code')} />}
      <div>
        <Button type="submit" icon="key" pending={pending} pendingLabel="Sending">
          Send a new way in
        </Button>
      </div>
      {done > 0 && (
        <Notice kind="clears" title="The mail is on its way" live="status">
          Its link sets password and second factor anew. Until it is used, the ones of now hold.
        </Notice>
      )}
    </form>
  );
}
