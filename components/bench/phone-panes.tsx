import { Sign, type SignKind } from '@/components/ui/sign';
import type { VerdictAnswer } from './verdict-messages';
import { headlineOf } from './verdict-words';

/** Under 900 px: the verdict sentence stays in sight, and one of two panes under it. */
export function PhonePanes({
  pane,
  onPane,
  sentence,
  sign,
}: {
  pane: 'parts' | 'verdict';
  onPane: (pane: 'parts' | 'verdict') => void;
  sentence: string;
  sign: SignKind | null;
}) {
  return (
    <div className="sticky top-0 z-10 border-b border-rule bg-paper px-4 pt-2 md:hidden">
      <p className="flex items-center gap-2 font-display text-panel">
        {sign && <Sign kind={sign} size={22} className="shrink-0" />}
        {sentence}
      </p>
      <div role="group" aria-label="What is shown" className="mt-1 flex gap-2">
        {(['parts', 'verdict'] as const).map((one) => (
          <button
            key={one}
            type="button"
            aria-pressed={pane === one}
            onClick={() => onPane(one)}
            className={`min-h-target flex-1 border-b-4 font-semibold ${pane === one ? 'border-copper' : 'border-transparent'}`}
          >
            {one === 'parts' ? 'Parts' : 'Verdict'}
          </button>
        ))}
      </div>
    </div>
  );
}

/** The verdict's headline with its sign, or why there is none yet. */
export function sentenceOf(
  answer: VerdictAnswer | null,
  band: { lo: number; hi: number },
): { sentence: string; sign: SignKind | null } {
  if (!answer) return { sentence: 'Working out the reach', sign: null };
  if (answer.kind === 'lacks') return { sentence: 'The verdict waits for parts', sign: 'waiting' };
  if (answer.kind === 'invalid') return { sentence: 'This set cannot be worked out', sign: 'stops' };
  const { title, sign } = headlineOf(answer.live.verdict, answer.live.findings, band);
  return { sentence: title, sign };
}
