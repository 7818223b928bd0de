import { LinkButton } from './link-button';

export type PagingProps = {
  /** Address of the older rows, or of the newer ones; left out at that end. */
  olderHref?: string | undefined;
  newerHref?: string | undefined;
  /** Only where it is cheap: "about 400". */
  count?: string | undefined;
  words?: readonly [newer: string, older: string];
};

/** Keyset paging: no page numbers, since rows come in while one reads. */
export function Paging({ olderHref, newerHref, count, words = ['Newer', 'Older'] }: PagingProps) {
  if (olderHref === undefined && newerHref === undefined) return null;
  return (
    <nav aria-label="Further rows" className="flex flex-wrap items-center gap-3 pt-3">
      {newerHref !== undefined && (
        <LinkButton href={newerHref} icon="back">
          {words[0]}
        </LinkButton>
      )}
      {olderHref !== undefined && (
        <LinkButton href={olderHref} iconAfter="arrow">
          {words[1]}
        </LinkButton>
      )}
      {count !== undefined && <p className="text-caption text-ink2">{count}</p>}
    </nav>
  );
}
