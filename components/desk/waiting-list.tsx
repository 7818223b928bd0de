import { LinkButton } from '@/components/ui/link-button';
import { Panel } from '@/components/ui/panel';
import { Sign, type SignKind } from '@/components/ui/sign';
import type { Waiting } from '@/services/desk/schemas';

/** What waits on the owner: a fact, its figure, and one way onward. */
export function WaitingList({ waiting }: { waiting: readonly Waiting[] }) {
  return (
    <Panel ground="open" title="Waiting on you">
      {waiting.length === 0 ? (
        <p>Nothing waits. What needs you lands here by itself.</p>
      ) : (
        <ul>
          {waiting.map((one) => {
            const { sign, title, text, href, word } = wordsOf(one);
            return (
              <li
                key={`${href} ${title}`}
                className="flex flex-wrap items-center gap-x-4 gap-y-2 border-t border-rule py-3"
              >
                <Sign kind={sign} size={24} />
                <div className="min-w-52 flex-1">
                  <b className="block">{title}</b>
                  <span className="text-caption text-ink2">{text}</span>
                </div>
                <LinkButton href={href}>
                  {word}
                  <span className="sr-only">: {title}</span>
                </LinkButton>
              </li>
            );
          })}
        </ul>
      )}
    </Panel>
  );
}

function wordsOf(one: Waiting): { sign: SignKind; title: string; text: string; href: string; word: string } {
  switch (one.kind) {
    case 'order':
      return {
        sign: 'note',
        title: `Look at order ${one.number}`,
        text: one.why,
        href: `/orders/${one.orderId}`,
        word: 'Look at it',
      };
    case 'held':
      return {
        sign: 'stops',
        title: `${one.name} ${one.kitNumber}\u202f${one.letter} was held`,
        text: one.why,
        href: `/bench/${one.versionId}`,
        word: 'Read it',
      };
    case 'price':
      return {
        sign: 'info',
        title: `${one.name} has no price`,
        text: 'It is released, and cannot be bought before it has one.',
        href: `/desk/kits#${one.code}`,
        word: 'Set it',
      };
    case 'short':
      return {
        sign: 'note',
        title: `${one.name} cannot be built`,
        text: `The store has no more of ${one.part}.`,
        href: `/store?q=${encodeURIComponent(one.part)}`,
        word: 'See the store',
      };
  }
}
