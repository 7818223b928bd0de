'use client';

import { signOut } from 'next-auth/react';
import { useState } from 'react';
import type { Action } from '@/components/forms/action-result';
import { Button } from '@/components/ui/button';
import { ErrorPanel } from '@/components/ui/notice';
import { loadAnew } from './enter';

/** Signs out here, or in every browser at once. */
export function SignOut({ onEverywhere }: { onEverywhere: Action<null, { done: true }> }) {
  const [under, setUnder] = useState<'here' | 'everywhere' | null>(null);
  const [fault, setFault] = useState<string | null>(null);

  async function leave(where: 'here' | 'everywhere'): Promise<void> {
    setUnder(where);
    setFault(null);
    try {
      const answer = where === 'everywhere' ? await onEverywhere(null) : null;
      if (answer && !answer.ok) throw new Error(answer.problem.sentence);
      await signOut({ redirect: false });
      loadAnew('/');
    } catch (error) {
      setFault(error instanceof Error ? error.message : 'You are still signed in. Try again in a moment.');
      setUnder(null);
    }
  }

  return (
    <div className="grid gap-4">
      {fault !== null && <ErrorPanel title="You are still signed in">{fault}</ErrorPanel>}
      <div className="flex flex-wrap gap-3">
        <Button icon="out" pending={under !== null} onClick={() => void leave('here')}>
          Sign out
        </Button>
        <Button variant="quiet" pending={under !== null} onClick={() => void leave('everywhere')}>
          Sign out everywhere
        </Button>
      </div>
    </div>
  );
}
