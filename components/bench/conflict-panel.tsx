'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { RadioGroup } from '@/components/ui/radio-group';
import type { Conflict } from './version-store';

/** Two people changed the same thing: both values side by side, and the reader chooses. Nothing is lost before. */
export function ConflictPanel({
  conflict,
  onSettle,
}: {
  conflict: Conflict;
  onSettle: (choices: Map<string, 'mine' | 'theirs'>) => void;
}) {
  const [choices, setChoices] = useState<ReadonlyMap<string, 'mine' | 'theirs'>>(new Map());
  const open = conflict.fields.filter(({ path }) => !choices.has(path)).length;
  return (
    <Notice
      kind="note"
      live="alert"
      level={2}
      title="Somebody changed the same values meanwhile"
      actions={
        <Button
          variant="primary"
          {...(open > 0 && { lockedReason: open === 1 ? 'Choose one of the two.' : `Choose for ${open} values.` })}
          onClick={() => onSettle(new Map(choices))}
        >
          Save my choice
        </Button>
      }
    >
      <p className="mb-2">
        Read what changed, then choose. What the other person changed elsewhere is kept either way.
      </p>
      <div className="grid gap-3">
        {conflict.fields.map(({ path, label, mine, theirs }) => (
          <RadioGroup
            key={path}
            legend={label}
            name={`choice-${path}`}
            layout="cards"
            value={choices.get(path)}
            onChange={(value) => setChoices(new Map(choices).set(path, value === 'mine' ? 'mine' : 'theirs'))}
            options={[
              { value: 'mine', label: mine, hint: 'Yours' },
              { value: 'theirs', label: theirs, hint: 'Theirs, saved already' },
            ]}
          />
        ))}
      </div>
    </Notice>
  );
}
