'use client';

import { TextField, type TextFieldProps } from '@/components/ui/field';

/** Asked for where rights change hands, however long one has been signed in. */
export function FreshCode(field: Omit<TextFieldProps, 'label'>) {
  return (
    <TextField
      label="Code"
      hint="The six figures of the moment, from your own authenticator."
      inputMode="numeric"
      autoComplete="one-time-code"
      figures
      frameClassName="sm:max-w-60"
      {...field}
    />
  );
}
