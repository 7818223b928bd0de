'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import type { Action } from '@/components/forms/action-result';
import { Button } from '@/components/ui/button';
import { FieldError } from '@/components/ui/field';
import type { OrderRef } from '@/services/orders/schemas';

export function ClaimOrder(props: {
  orderRef: OrderRef;
  onClaim: Action<OrderRef, { orderId: string }>;
  done: string;
}) {
  const { orderRef, onClaim, done } = props;
  const router = useRouter();
  const [isPending, setPending] = useState(false);
  const [trouble, setTrouble] = useState<string | null>(null);

  async function claim() {
    setPending(true);
    const answer = await onClaim(orderRef);
    setPending(false);
    if (answer.ok) router.push(done);
    else setTrouble(answer.problem.sentence);
  }

  return (
    <div>
      <Button variant="primary" size="big" pending={isPending} onClick={claim}>
        Keep it in my account
      </Button>
      <div aria-live="polite">{trouble && <FieldError>{trouble}</FieldError>}</div>
    </div>
  );
}
