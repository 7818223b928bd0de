import { classes } from '@/components/ui/classes';

export type PlateProps = {
  /** The kit's number, such as 7 or "CY-07". */
  kit: string | number;
  /** The version's letter; without it the plate names the kit alone. */
  version?: string | undefined;
  /** `row` in lists, `page` beside a title, `floor` on the packing tablet, `print` in one ink on a white sheet. */
  size?: 'row' | 'page' | 'floor' | 'print';
  className?: string;
};

const frames: Record<NonNullable<PlateProps['size']>, string> = {
  row: 'plate-frame px-3.5 py-1',
  page: 'plate-frame px-5 py-2',
  floor: 'plate-frame px-6 py-2.5',
  print: 'rounded-plate border-3 border-double border-sheet-ink bg-sheet px-4 py-1.5 text-sheet-ink',
};
const names: Record<NonNullable<PlateProps['size']>, string> = {
  row: 'text-[14px] leading-[18px]',
  page: 'text-[18px] leading-6',
  floor: 'text-[22px] leading-7',
  print: 'text-[16px] leading-5',
};
const letters: Record<NonNullable<PlateProps['size']>, string> = {
  row: 'text-[13px]',
  page: 'text-[16px]',
  floor: 'text-[20px]',
  print: 'text-[14px]',
};

/** The riveted plate: "No. 7 | B". The same on screen, lid, slip and guide; people match it by eye. */
export function Plate({ kit, version, size = 'page', className }: PlateProps) {
  const said = version === undefined ? `Kit number ${kit}` : `Kit number ${kit}, version ${version}`;
  return (
    <span className={classes('inline-flex w-fit shrink-0 items-center whitespace-nowrap', frames[size], className)}>
      {size !== 'print' && <Rivets near={size === 'row'} />}
      <span className="sr-only">{said}</span>
      <span aria-hidden className={classes('font-display', names[size])}>
        {size === 'row' && version === undefined ? kit : `No. ${kit}`}
      </span>
      {version !== undefined && (
        <>
          <span aria-hidden className="mx-2 h-[1em] w-px bg-current opacity-60" />
          <span aria-hidden className={classes('font-figures font-semibold', letters[size])}>
            {version}
          </span>
        </>
      )}
    </span>
  );
}

export function Rivets({ near = false }: { near?: boolean }) {
  const rivet = 'absolute top-1/2 size-[5px] -translate-y-1/2 rounded-full bg-copper-lite ring-1 ring-plate-deep';
  return (
    <>
      <span aria-hidden className={classes(rivet, near ? 'left-[5px]' : 'left-[9px]')} />
      <span aria-hidden className={classes(rivet, near ? 'right-[5px]' : 'right-[9px]')} />
    </>
  );
}
