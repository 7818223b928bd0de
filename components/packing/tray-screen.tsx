'use client';

import { useCallback, useRef, useState } from 'react';
import type { BoxView } from '@/services/packing/schemas';
import { BoxHead } from './box-head';
import type { BoxDeeds } from './deeds';
import { FetchPanel } from './fetch-panel';
import { HandsPanel } from './hands-panel';
import { LidPanel } from './lid-panel';
import { TrayView } from './tray-view';
import { useBox } from './use-box';
import { useScanner } from './use-scanner';
import { useTone } from './use-tone';

export interface TrayScreenProps {
  initial: BoxView;
  mayPack: boolean;
  deeds: BoxDeeds;
}

/** One box: its tray at the left; at the right what to fetch, then what the lid needs. The scanner is heard throughout. */
export function TrayScreen({ initial, mayPack, deeds }: TrayScreenProps) {
  const tone = useTone();
  const { box, answer, dismiss, scan, change, isBusy, isOffline } = useBox(initial, deeds, tone.sound);
  const scanField = useRef<HTMLInputElement>(null);
  const [code, setCode] = useState('');
  const inHands = mayPack && box.claim?.mine === true && box.state === 'packing';

  const onScan = useCallback(
    (text: string) => {
      setCode('');
      if (inHands && text.trim() !== '') void scan(text);
    },
    [inHands, scan],
  );
  useScanner(scanField, onScan);

  const field = { ref: scanField, value: code, onChange: setCode, onSend: onScan };
  const isFull = box.pieces.packed === box.pieces.needed;

  return (
    <main
      id="main"
      className="grid min-h-[calc(100dvh-96px)] grid-rows-[auto_1fr] md:h-[calc(100dvh-96px)] md:overflow-hidden"
    >
      <BoxHead box={box} sound={tone} />
      {isOffline && (
        <p role="alert" className="border-b-2 border-ochre bg-ochre-wash px-7 py-2 font-bold text-ochre">
          No line to the yard. Scans are kept on this tablet and sent when it returns.
        </p>
      )}
      <div className="grid min-h-0 md:grid-cols-[minmax(0,1fr)_minmax(380px,34%)]">
        <TrayView
          box={box}
          onPutBack={inHands ? (lineId) => change(() => deeds.putBack({ boxId: box.id, lineId })) : null}
        />
        <section
          aria-label="What to do"
          className="ground-plate flex min-h-0 flex-col gap-3 px-6 py-4 max-md:order-first"
        >
          {!inHands ? (
            <HandsPanel
              box={box}
              mayPack={mayPack}
              isBusy={isBusy}
              onClaim={() => change(() => deeds.claimBox({ boxId: box.id }))}
            />
          ) : isFull ? (
            <LidPanel
              box={box}
              answer={answer}
              dismiss={dismiss}
              deeds={deeds}
              change={change}
              isBusy={isBusy}
              field={field}
            />
          ) : (
            <FetchPanel
              box={box}
              answer={answer}
              dismiss={dismiss}
              scan={scan}
              isBusy={isBusy}
              field={field}
              onEmpty={(lineId) => change(() => deeds.tellEmpty({ boxId: box.id, lineId }))}
            />
          )}
        </section>
      </div>
    </main>
  );
}
