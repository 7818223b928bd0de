import { Plate } from '@/components/devices/plate';
import { Progress } from '@/components/ui/progress';
import type { BoxView } from '@/services/packing/schemas';

/** Order, plate and buyer at the left; how much is in the tray at the right. */
export function BoxHead({ box, sound }: { box: BoxView; sound: { isOn: boolean; toggle: () => void } }) {
  return (
    <header className="flex flex-wrap items-center gap-x-6 gap-y-2 border-b-2 border-ink bg-paper px-4 py-2 sm:px-7">
      <h1 className="contents">
        <span className="font-figures text-[30px] leading-9 font-semibold">{box.orderNumber}</span>
        <Plate kit={box.plate.kitNumber} version={box.plate.letter} size="floor" />
        <span className="min-w-0 leading-6">
          <b className="block text-[20px]">{box.plate.kitName}</b>
          {box.buyer}, box {box.position} of {box.of}
        </span>
      </h1>
      <p className="font-figures text-body">
        {box.serial}
        <span className="block text-caption">content {box.hash}</span>
      </p>
      <div className="ml-auto flex min-w-0 items-center gap-4 max-sm:basis-full">
        <button
          type="button"
          onClick={sound.toggle}
          aria-pressed={sound.isOn}
          className="min-h-14 rounded-control border-1.5 border-ink bg-card px-4 text-body font-bold whitespace-nowrap"
        >
          Sound {sound.isOn ? 'on' : 'off'}
        </button>
        <div className="w-[250px] min-w-0 max-sm:flex-1">
          <Progress label="In the tray" done={box.pieces.packed} of={box.pieces.needed} />
        </div>
      </div>
    </header>
  );
}
