import { Rivets } from './plate';

/** The house plate. Put it in a link that says where it goes. */
export function Wordmark({ small = false }: { small?: boolean }) {
  return (
    <span className="plate-frame inline-flex w-fit shrink-0 items-center px-5.5 pt-2 pb-2.25">
      <Rivets />
      <span
        className={`font-display ${small ? 'text-[19px] leading-6' : 'text-[19px] leading-6 sm:text-[22px] sm:leading-6.5'}`}
      >
        Coilyard
      </span>
    </span>
  );
}

/** The initial alone, for the staff rooms' spine. */
export function HouseInitial() {
  return (
    <span className="plate-frame grid size-11.5 place-items-center">
      <span aria-hidden className="font-display text-[26px] leading-none">
        C
      </span>
      <span className="sr-only">Coilyard</span>
    </span>
  );
}
