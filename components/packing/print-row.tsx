'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { LinkButton } from '@/components/ui/link-button';
import { Sign } from '@/components/ui/sign';
import type { BoxView } from '@/services/packing/schemas';
import { showClock } from '@/services/time';

export interface PrintRowProps {
  box: BoxView;
  paper: 'guide' | 'slip';
  printedAt: number | null;
  isLocked: boolean;
  isBusy: boolean;
  onPrinted: () => void;
}

const names = { guide: 'guide', slip: 'packing slip' } as const;

/** Opens a paper to print, then asks whether it lies in the tray: only the packer knows what the printer did. */
export function PrintRow({ box, paper, printedAt, isLocked, isBusy, onPrinted }: PrintRowProps) {
  const [wasOpened, setOpened] = useState(false);
  const href = `/papers/${paper}/${box.id}`;
  const name = names[paper];
  return (
    <li className="grid gap-2 rounded-panel bg-card px-4 py-3 text-ink [--focus:var(--enamel)]">
      <span className="flex items-center gap-3">
        <Sign kind={printedAt === null ? 'waiting' : 'clears'} size={28} />
        <b>{printedAt === null ? `Print the ${name}` : `The ${name} is printed, ${showClock(printedAt)}`}</b>
      </span>
      {!isLocked && (
        <span className="grid auto-cols-fr grid-flow-col gap-3">
          <LinkButton
            href={href}
            target="_blank"
            prefetch={false}
            size="floor"
            icon="print"
            onClick={() => setOpened(true)}
            className="px-2"
          >
            A4
          </LinkButton>
          <LinkButton
            href={`${href}?size=letter`}
            target="_blank"
            prefetch={false}
            size="floor"
            icon="print"
            onClick={() => setOpened(true)}
            className="px-2"
          >
            Letter
          </LinkButton>
          {printedAt === null && wasOpened && (
            <Button variant="primary" size="floor" pending={isBusy} onClick={onPrinted} className="px-2">
              It is printed
            </Button>
          )}
        </span>
      )}
    </li>
  );
}
