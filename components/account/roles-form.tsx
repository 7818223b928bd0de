'use client';

import type { Action } from '@/components/forms/action-result';
import { FormErrorSummary } from '@/components/forms/form-error-summary';
import { useActionForm } from '@/components/forms/use-action-form';
import { Button } from '@/components/ui/button';
import { Checkbox } from '@/components/ui/checkbox';
import { Notice } from '@/components/ui/notice';
import { ChangeRoles, type PersonView } from '@/services/people/schemas';
import { FreshCode } from './fresh-code';
import { RoleBoxes } from './role-boxes';

export function RolesForm(props: {
  person: PersonView;
  needsCode: boolean;
  onChange: Action<ChangeRoles, PersonView>;
}) {
  const { person, needsCode, onChange } = props;
  const { form, field, submit, pending, summary, problem, done } = useActionForm({
    schema: ChangeRoles,
    action: onChange,
    defaultValues: { personId: person.id, roles: [...person.roles], disabled: person.disabledAt !== null, code: '' },
    onDone: () => form.setValue('code', ''),
  });
  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid gap-4">
      <FormErrorSummary summary={summary} problem={problem} />
      <RoleBoxes {...field('roles')} />
      <Checkbox
        label="Signing in is off"
        hint="For somebody who left. Work and name stay where they are."
        {...field('disabled')}
      />
      {needsCode && <FreshCode {...field('code')} />}
      <div>
        <Button type="submit" variant="primary" pending={pending} pendingLabel="Changing">
          Change the roles
        </Button>
      </div>
      {done > 0 && (
        <Notice kind="clears" title="Changed" live="status">
          {person.name} is signed out everywhere and told by mail.
        </Notice>
      )}
    </form>
  );
}
