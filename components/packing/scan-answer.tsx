import { Button } from '@/components/ui/button';
import { classes } from '@/components/ui/classes';
import { Notice } from '@/components/ui/notice';
import { showClock } from '@/services/time';
import type { Answer } from './use-box';

export interface ScanAnswerProps {
  answer: Answer | null;
  dismiss: () => void;
  /** Counts a handful in at once. */
  onRest?: ((code: string, pieces: number) => void) | undefined;
}

/**
 * The last scan in shape, word and colour. A wrong one stays until the next right scan, or until the packer says that
 * the piece was put back; it stands over everything else.
 */
export function ScanAnswer({ answer, dismiss, onRest }: ScanAnswerProps) {
  return (
    <div
      role="status"
      aria-live="assertive"
      className={classes('empty:hidden', answer !== null && answer.kind !== 'right' && 'order-first')}
    >
      {answer?.kind === 'right' && (
        <Notice
          kind="clears"
          size="floor"
          title={answer.title}
          actions={
            answer.rest && onRest ? (
              <Button size="floor" onClick={() => answer.rest && onRest(answer.rest.code, answer.rest.pieces)}>
                Count {answer.rest.pieces} more in
              </Button>
            ) : undefined
          }
        >
          Scanned at {showClock(answer.at)}. {answer.sentence}
        </Notice>
      )}
      {answer?.kind === 'wrong' && (
        <Notice
          kind="stops"
          size="floor"
          title={answer.title}
          actions={
            <Button variant="danger" size="floor" onClick={dismiss}>
              Put it back
            </Button>
          }
        >
          {answer.sentence}
        </Notice>
      )}
      {answer?.kind === 'problem' && (
        <Notice
          kind="stops"
          size="floor"
          title={answer.title}
          actions={
            <Button size="floor" onClick={dismiss}>
              Read
            </Button>
          }
        >
          {answer.sentence}
        </Notice>
      )}
    </div>
  );
}
