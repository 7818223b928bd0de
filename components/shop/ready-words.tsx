import { Sign } from '@/components/ui/sign';

/** How many boxes the store makes now, in words that hold when there are none. */
export function ReadyWords(props: { ready: number; isPriced: boolean; children?: React.ReactNode }) {
  const { ready, isPriced, children } = props;
  const isReady = isPriced && ready > 0;
  const words = !isPriced
    ? 'Not on sale yet: its price is being set.'
    : ready === 0
      ? 'None ready just now. The next delivery of parts brings it back.'
      : ready === 1
        ? 'One box ready.'
        : `${ready} boxes ready.`;
  return (
    <p className="mt-1 flex items-start gap-2 text-caption text-ink2">
      <Sign kind={isReady ? 'clears' : 'waiting'} size={16} className="mt-0.5" />
      <span>
        <b className={isReady ? 'text-pine' : 'text-ink'}>{words}</b> {children}
      </span>
    </p>
  );
}
