import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { pieces as piecesWords } from '@/services/packing/rules';
import type { BoxView, TrayPlace } from '@/services/packing/schemas';
import { CloseLocked } from './close-button';
import { CodeField, type CodeFieldProps } from './code-field';
import { PanelFrame } from './panel-frame';
import { PartPicture } from './part-picture';
import { ScanAnswer } from './scan-answer';
import type { Answer } from './use-box';

export interface FetchPanelProps {
  box: BoxView;
  answer: Answer | null;
  dismiss: () => void;
  scan: (code: string, pieces?: number) => Promise<boolean>;
  isBusy: boolean;
  field: CodeFieldProps;
  onEmpty: (lineId: string) => void;
}

/** While places are empty: the bin to go to, what to take, how the last scan went, and what comes after. */
export function FetchPanel({ box, answer, dismiss, scan, isBusy, field, onEmpty }: FetchPanelProps) {
  const next = box.places.find((place) => place.lineId === box.nextLineId);
  const then = box.places.filter((place) => place.state === 'waiting').slice(0, 3);
  const left = box.pieces.needed - box.pieces.packed;
  return (
    <PanelFrame
      attention={answer}
      foot={
        <>
          <CodeField {...field} />
          <div className="grid grid-cols-[auto_minmax(0,1fr)] gap-3">
            {next ? (
              <Button
                variant="outline"
                size="floor"
                pending={isBusy}
                className="px-4"
                onClick={() => onEmpty(next.lineId)}
              >
                Bin is empty
              </Button>
            ) : (
              <span />
            )}
            <CloseLocked reason={`${piecesWords(left)} to go`} />
          </div>
        </>
      }
    >
      {next ? <Next place={next} /> : <NothingLeft />}
      <ScanAnswer answer={answer} dismiss={dismiss} onRest={(code, pieces) => void scan(code, pieces)} />
      {then.length > 0 && (
        <div>
          <h3 className="text-body font-bold">Then</h3>
          <ul className="text-on-enamel2">
            {then.map((place) => (
              <li key={place.lineId} className="flex gap-3">
                <span className="w-20 shrink-0 font-figures font-semibold">{place.suggestion?.binCode}</span>
                {place.name}, {place.amount}
              </li>
            ))}
          </ul>
        </div>
      )}
    </PanelFrame>
  );
}

function Next({ place }: { place: TrayPlace }) {
  return (
    <div>
      <p className="text-[20px] leading-[26px] text-on-enamel2">Fetch from bin</p>
      <p className="font-display text-bin [@media(max-height:840px)]:-my-2">{place.suggestion?.binCode}</p>
      <h2 className="font-display text-[30px] leading-9">{place.name}</h2>
      <div className="mt-3 grid grid-cols-[1fr_auto] items-center gap-4 rounded-panel bg-card px-5 py-3 text-ink">
        <PartPicture family={place.family} height={96} className="mx-auto max-w-full [@media(max-height:840px)]:h-16" />
        <p className="text-[17px] leading-6">
          <b className="block font-figures text-[44px] leading-[50px] font-semibold whitespace-nowrap [@media(max-height:840px)]:text-[32px] [@media(max-height:840px)]:leading-9">
            {place.amount}
          </b>
          {place.note !== '' && <span className="block max-w-48">{place.note}</span>}
          <span className="block">
            line <b className="font-figures">{place.reference}</b>
          </span>
          <span className="block whitespace-nowrap">
            lot <b className="font-figures">{place.suggestion?.lotCode}</b>
          </span>
        </p>
      </div>
    </div>
  );
}

function NothingLeft() {
  return (
    <Notice kind="note" size="floor" title="The store has none of what is missing" level={2}>
      The empty places are told. Take another box meanwhile; this one keeps what is in it.
    </Notice>
  );
}
