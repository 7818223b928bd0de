'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import type { Action } from '@/components/forms/action-result';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import type { PartView, RetirePart as Retire } from '@/services/parts/schemas';

/** Takes a part out of use, or back into it. */
export function RetirePart({ part, retirePart }: { part: PartView; retirePart: Action<Retire, PartView> }) {
  const [sentence, setSentence] = useState<string | null>(null);
  const [isSending, setSending] = useState(false);
  const router = useRouter();

  async function send() {
    setSending(true);
    const answer = await retirePart({ partId: part.id, basedOn: part.saveNo, retired: !part.retired });
    setSending(false);
    setSentence(answer.ok ? null : answer.problem.sentence);
    if (answer.ok) router.refresh();
  }

  return (
    <div className="grid justify-items-start gap-2">
      <Button variant={part.retired ? 'plain' : 'danger'} pending={isSending} onClick={() => void send()}>
        {part.retired ? `Take ${part.code} back into use` : `Retire ${part.code}`}
      </Button>
      <p className="text-caption text-ink2">
        {part.retired
          ? 'It is not offered for new lines, and a draft with it cannot be sent to check.'
          : 'A retired part is not offered any more. Versions that have it keep it.'}
      </p>
      {sentence !== null && (
        <Notice kind="stops" title="Not done" live="alert">
          {sentence}
        </Notice>
      )}
    </div>
  );
}
