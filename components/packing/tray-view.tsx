'use client';

import { useEffect, useRef, useState } from 'react';
import { Tray, TrayPlace, type PlaceState } from '@/components/devices/tray';
import { Button } from '@/components/ui/button';
import { classes } from '@/components/ui/classes';
import { Dialog } from '@/components/ui/dialog';
import { amountText, lowerFirst } from '@/services/packing/rules';
import type { BoxView, TrayPlace as Place } from '@/services/packing/schemas';
import { PartPicture } from './part-picture';

export interface TrayViewProps {
  box: BoxView;
  /** Null where nothing may be taken out. */
  onPutBack: ((lineId: string) => Promise<boolean>) | null;
}

const states: Record<Place['state'], PlaceState> = { waiting: 'waiting', next: 'next', in: 'in', told: 'bin-empty' };

/** The tray in plan: a place a line, then the guide. A place with something in it can be pressed to put a piece back. */
export function TrayView({ box, onPutBack }: TrayViewProps) {
  const [asked, setAsked] = useState<Place | null>(null);
  const tray = useRef<HTMLElement>(null);
  // A fifth column keeps a box of many lines on one screen.
  const isCrowded = box.places.length > 11;
  const isLocked = box.pieces.packed < box.pieces.needed;
  // A long tray scrolls; the place that is next is always in sight.
  useEffect(() => {
    tray.current?.querySelector('[data-state=next]')?.scrollIntoView({ block: 'nearest' });
  }, [box.nextLineId]);

  return (
    <section ref={tray} aria-label="Tray" tabIndex={0} className="min-h-0 overflow-y-auto p-4 sm:p-5">
      <Tray
        label="Places of the tray"
        className={classes('min-h-full', isCrowded && 'md:max-lg:grid-cols-3! lg:grid-cols-5')}
      >
        {box.places.map((place) => (
          <TrayPlace
            key={place.lineId}
            state={states[place.state]}
            name={shortName(place)}
            drawing={
              <PlaceDrawing
                place={place}
                height={isCrowded ? 52 : 80}
                onPress={onPutBack && place.packed > 0 ? () => setAsked(place) : null}
              />
            }
            have={place.unit === 'each' ? place.packed : place.state === 'in' ? 1 : 0}
            need={place.unit === 'each' ? place.needed : 1}
            bin={place.suggestion?.binCode}
            word={place.suggestion === null ? 'told' : undefined}
            span={place.kind === 'coil-former' && !isCrowded ? 2 : 1}
          />
        ))}
        <TrayPlace
          state={box.guide.scannedAt !== null ? 'in' : isLocked ? 'waiting' : 'next'}
          name={`Guide ${box.plate.kitNumber} ${box.plate.letter}`}
          drawing={<PartPicture family="guide" height={isCrowded ? 52 : 80} />}
          have={box.guide.scannedAt === null ? 0 : 1}
          need={1}
          bin="print"
        />
      </Tray>
      <Dialog
        isOpen={asked !== null}
        onClose={() => setAsked(null)}
        title={asked ? `Put ${oneOf(asked)} back?` : ''}
        answers={
          <>
            <Button
              variant="primary"
              size="floor"
              onClick={() => {
                if (asked && onPutBack) void onPutBack(asked.lineId);
                setAsked(null);
              }}
            >
              Put it back
            </Button>
            <Button size="floor" onClick={() => setAsked(null)}>
              Leave it in
            </Button>
          </>
        }
      >
        It returns to the bin it came from, and the tray asks for it again.
      </Dialog>
    </section>
  );
}

/** "Enamelled wire, 14 m": what tells parts apart stands in full at the right; a cut length always says its length. */
const shortName = (place: Place) => {
  const [what = place.name] = place.name.split(',');
  return place.unit === 'each' ? what : `${what}, ${amountText(place.needed, place.unit)}`;
};

const oneOf = (place: Place) => (place.unit === 'each' ? `one ${lowerFirst(place.name)}` : lowerFirst(place.name));

function PlaceDrawing({ place, height, onPress }: { place: Place; height: number; onPress: (() => void) | null }) {
  const picture = <PartPicture family={place.family} height={height} />;
  if (!onPress) return picture;
  return (
    <button
      type="button"
      onClick={onPress}
      aria-label={`Put back: ${oneOf(place)}`}
      className="grid min-h-floor min-w-floor place-items-center rounded-tag"
    >
      {picture}
    </button>
  );
}
