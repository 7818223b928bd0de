import { Sign } from '@/components/ui/sign';
import type { Finding } from '@/services/kits/rules';
import type { Verdict } from '@/services/receiver';
import { headlineOf, type shareWords } from './verdict-words';

const tones = {
  clears: 'text-pine',
  note: 'text-ochre',
  stops: 'text-crimson',
  info: 'text-ink',
  waiting: 'text-ink2',
};

/** The verdict as a sentence, and the share of boxes beside it. */
export function VerdictHead(props: {
  verdict: Verdict;
  findings: readonly Finding[];
  band: { lo: number; hi: number };
  share: ReturnType<typeof shareWords>;
}) {
  const { sign, title, text } = headlineOf(props.verdict, props.findings, props.band);
  return (
    <div className="flex flex-wrap items-start gap-x-5 gap-y-3">
      <Sign kind={sign} size={42} className="mt-0.5 shrink-0 max-md:hidden" />
      <div className="min-w-64 flex-1">
        {/* Under 900 px the same sentence stays pinned above the panes. */}
        <h2 className={`font-display text-verdict max-md:sr-only ${tones[sign]}`}>{title}</h2>
        <p className="max-w-[34rem]">{text}</p>
      </div>
      {props.share && (
        <p className="md:ml-[62px] lg:ml-0 lg:text-right">
          <span className="block font-figures text-[34px] leading-[38px] font-semibold">{props.share.figure}</span>
          <span className="block max-w-40 text-caption text-ink2">{props.share.text}</span>
        </p>
      )}
    </div>
  );
}
