'use client';

import { WindingMark } from '@/components/devices/winding-mark';
import { Button } from '@/components/ui/button';
import { LinkButton } from '@/components/ui/link-button';
import { TabLinks } from '@/components/ui/tab-links';
import { latestLetter, letterAfter } from '@/services/kits/rules';
import type { VersionView } from '@/services/kits/schemas';
import { bandName } from '@/services/catalogue/rules';
import { shownKHz } from '@/templates/drawings/reach-axis';

export interface VersionHeadProps {
  view: VersionView;
  /** `guide` on the page of the guide: its tab of the same letter stays current. */
  page: 'parts' | 'guide';
  onStart?: (() => void) | undefined;
  starting?: boolean;
}

/** Name and band of the kit, its versions as tabs with their winding marks, and the way to the next letter. */
export function VersionHead({ view, page, onStart, starting = false }: VersionHeadProps) {
  const { kit } = view.content;
  const next = letterAfter(latestLetter(view.siblings.map(({ letter }) => letter)));
  return (
    <header className="px-4 pt-4 sm:px-6">
      <div className="flex flex-wrap items-baseline gap-x-4 gap-y-1">
        <h1 className="font-display text-section sm:text-[30px] sm:leading-9">{kit.name}</h1>
        <p className="text-caption text-ink2">
          {`No. ${kit.number}, ${bandName(kit.band)} ${shownKHz(kit.band.firstCarrier)} to ${shownKHz(kit.band.lastCarrier)} kHz`}
          <span className="sr-only">{`, version ${view.letter}`}</span>
        </p>
        <LinkButton
          href={page === 'parts' ? `/bench/${view.id}/guide` : `/bench/${view.id}`}
          size="small"
          className="ml-auto"
          icon={page === 'parts' ? 'guides' : 'parts'}
        >
          {page === 'parts' ? 'Build guide' : 'Parts and verdict'}
        </LinkButton>
      </div>
      <div className="mt-2 flex flex-wrap items-end gap-x-4">
        <TabLinks
          label={`Versions of ${kit.name}`}
          className="min-w-0"
          links={view.siblings.map(({ id, letter, state }) => ({
            href: page === 'parts' ? `/bench/${id}` : `/bench/${id}/guide`,
            isCurrent: id === view.id,
            label: (
              <>
                <span className="font-figures font-semibold whitespace-nowrap">{`${kit.number} ${letter}`}</span>
                <WindingMark state={state} />
              </>
            ),
          }))}
        />
        {onStart && (
          <Button variant="quiet" icon="plus" onClick={onStart} pending={starting} pendingLabel="Starting it">
            {`Start ${kit.number} ${next} from here`}
          </Button>
        )}
      </div>
    </header>
  );
}
