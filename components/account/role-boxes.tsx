'use client';

import type { UseFormRegisterReturn } from 'react-hook-form';
import { Checkbox } from '@/components/ui/checkbox';
import { FieldError } from '@/components/ui/field';
import { roles } from '@/services/access/actor';

const work = {
  designer: 'Chooses parts, makes versions, sends them to check',
  checker: 'Holds or releases versions that others made',
  packer: 'Receives stock, packs and ships boxes',
  owner: 'Prices, people, the desk and the record of changes',
} as const;

/** One box a role, each with what it is for. */
export function RoleBoxes({ id, error, ...boxes }: UseFormRegisterReturn & { id: string; error?: string | undefined }) {
  return (
    <fieldset id={id} tabIndex={-1} aria-describedby={error === undefined ? undefined : `${id}-error`}>
      <legend className="font-bold">Roles</legend>
      {roles.map((role) => (
        <Checkbox key={role} label={nameOf(role)} hint={work[role]} value={role} {...boxes} />
      ))}
      {error !== undefined && <FieldError id={`${id}-error`}>{error}</FieldError>}
    </fieldset>
  );
}

const nameOf = (role: string) => role.charAt(0).toUpperCase() + role.slice(1);
