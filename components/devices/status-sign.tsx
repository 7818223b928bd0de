import { classes } from '@/components/ui/classes';
import { Sign, type SignKind } from '@/components/ui/sign';

export type { SignKind };

export const signWords: Record<SignKind, string> = {
  clears: 'Clears',
  note: 'Note',
  stops: 'Stops',
  info: 'Info',
  waiting: 'Waiting',
};

const tones: Record<SignKind, string> = {
  clears: 'text-pine',
  note: 'text-ochre',
  stops: 'text-crimson',
  info: 'text-enamel',
  waiting: 'text-ink2',
};

export type StatusSignProps = {
  kind: SignKind;
  /** In place of the usual word: "Right", "Held", "told". */
  word?: string | undefined;
  size?: number;
  className?: string;
};

/** Shape first, word second, colour third. */
export function StatusSign({ kind, word, size = 20, className }: StatusSignProps) {
  return (
    <span className={classes('inline-flex items-center gap-2 whitespace-nowrap', className)}>
      <Sign kind={kind} size={size} />
      <b className={tones[kind]}>{word ?? signWords[kind]}</b>
    </span>
  );
}
