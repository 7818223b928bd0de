import { Sign } from '@/components/ui/sign';
import type { ActionResult } from '@/components/forms/action-result';
import type { BoxView } from '@/services/packing/schemas';
import { showClock } from '@/services/time';
import { CloseButton } from './close-button';
import { CodeField, type CodeFieldProps } from './code-field';
import type { BoxDeeds } from './deeds';
import { PanelFrame } from './panel-frame';
import { PrintRow } from './print-row';
import { ScanAnswer } from './scan-answer';
import type { Answer } from './use-box';
import { WeighForm } from './weigh-form';

export interface LidPanelProps {
  box: BoxView;
  answer: Answer | null;
  dismiss: () => void;
  deeds: BoxDeeds;
  change: (deed: () => Promise<ActionResult<BoxView>>) => Promise<boolean>;
  isBusy: boolean;
  field: CodeFieldProps;
}

/** When everything is in: papers, the guide's code, the scale, and then the lid. */
export function LidPanel({ box, answer, dismiss, deeds, change, isBusy, field }: LidPanelProps) {
  const name = `${box.plate.kitNumber} ${box.plate.letter}`;
  const isReleased = box.versionState === 'released';
  return (
    <PanelFrame
      attention={answer}
      foot={
        <>
          <CodeField {...field} />
          <CloseButton
            reasons={box.reasons}
            isBusy={isBusy}
            onClose={() => void change(() => deeds.closeBox({ boxId: box.id }))}
          />
        </>
      }
    >
      <h2 className="font-display text-[30px] leading-9">Everything is in</h2>
      <ScanAnswer answer={answer} dismiss={dismiss} />
      <div className="rounded-panel bg-card px-4 py-3 text-ink">
        <p className="flex items-center gap-2 font-bold">
          <Sign kind={isReleased ? 'clears' : 'stops'} size={24} />
          {isReleased ? `Tray, guide and version are ${name}, released` : `Version ${name} is not released`}
        </p>
        <p className="text-body">
          content <span className="font-figures">{box.hash}</span>
        </p>
      </div>
      <ol className="grid grid-cols-[minmax(0,1fr)] gap-3">
        <PrintRow
          box={box}
          paper="guide"
          printedAt={box.guide.printedAt}
          isLocked={!isReleased}
          isBusy={isBusy}
          onPrinted={() => change(() => deeds.markPrinted({ boxId: box.id, paper: 'guide' }))}
        />
        <PrintRow
          box={box}
          paper="slip"
          printedAt={box.slipPrintedAt}
          isLocked={!isReleased}
          isBusy={isBusy}
          onPrinted={() => change(() => deeds.markPrinted({ boxId: box.id, paper: 'slip' }))}
        />
        <li className="flex items-center gap-3 rounded-panel bg-card px-4 py-3 text-ink">
          <Sign kind={box.guide.scannedAt === null ? 'waiting' : 'clears'} size={28} />
          <span>
            <b className="block">{box.guide.scannedAt === null ? 'Scan the code on the guide' : 'Guide scanned'}</b>
            {box.guide.scannedAt === null
              ? 'It stands at the foot of the cover, under the square.'
              : `at ${showClock(box.guide.scannedAt)}, right for this box`}
          </span>
        </li>
        <WeighForm
          box={box}
          isBusy={isBusy}
          onWeigh={(milligrams) => change(() => deeds.weigh({ boxId: box.id, milligrams }))}
        />
      </ol>
      {box.reasons.length > 0 && (
        <div>
          <h3 className="text-body font-bold">Before the lid closes</h3>
          <ul className="list-disc pl-6 text-on-enamel2">
            {box.reasons.map((reason) => (
              <li key={reason}>{reason}</li>
            ))}
          </ul>
        </div>
      )}
    </PanelFrame>
  );
}
