'use client';

import type { ReactNode } from 'react';
import { Button } from '@/components/ui/button';
import { Icon } from '@/components/ui/icon';
import { Sign } from '@/components/ui/sign';
import { formatMoney, money } from '@/services/money';
import { grouped } from '@/services/quantity';
import { showClock, showMoment } from '@/services/time';
import type { SaveState } from './version-store';

export interface FootBarProps {
  costMinor: number;
  massMilligrams: number;
  pieces: number;
  save: SaveState | null;
  onRetry: () => void;
  /** Undo and redo, and the one onward action. */
  children?: ReactNode;
}

/** Cost, mass and the state of saving at the left, the way on at the right. Stays in sight. */
export function FootBar({ costMinor, massMilligrams, pieces, save, onRetry, children }: FootBarProps) {
  return (
    <footer className="sticky bottom-18 z-10 flex flex-wrap items-center gap-x-3 gap-y-1 border-t border-rule bg-paper px-4 py-2 sm:px-6 sm:gap-x-5 md:bottom-0 md:py-2.5">
      <p className="text-caption sm:text-table">
        <span className="max-sm:sr-only">Parts cost</span>{' '}
        <span className="font-figures font-semibold">{formatMoney(money(costMinor, 'GBP'))}</span>,{' '}
        <span className="font-figures font-semibold">{grouped(Math.round(massMilligrams / 1000))}</span> g,{' '}
        <span className="font-figures font-semibold">{pieces}</span> {pieces === 1 ? 'piece' : 'pieces'}.
      </p>
      {save && <SaveMark save={save} onRetry={onRetry} />}
      <div className="ml-auto flex flex-wrap items-center justify-end gap-x-3 gap-y-1 max-sm:basis-full">
        {children}
      </div>
    </footer>
  );
}

function SaveMark({ save, onRetry }: { save: SaveState; onRetry: () => void }) {
  return (
    <div role="status" aria-live="polite" className="flex min-h-6 items-center gap-2 text-caption text-ink2">
      {save.kind === 'saved' && (
        <>
          <Icon name="check" size={16} className="max-sm:hidden" />
          {`Saved ${save.earlier ? showMoment(save.at) : showClock(save.at)}`}
        </>
      )}
      {save.kind === 'waiting' && 'Not saved yet'}
      {save.kind === 'saving' && 'Saving'}
      {save.kind === 'conflict' && (
        <>
          <Sign kind="note" size={16} />
          Waits for your choice
        </>
      )}
      {save.kind === 'failed' && (
        <>
          <Sign kind="stops" size={16} />
          <span className="max-w-80 text-crimson">{save.problem.sentence}</span>
          <Button size="small" onClick={onRetry}>
            Try again
          </Button>
        </>
      )}
    </div>
  );
}
