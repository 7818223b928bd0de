import { classes } from './classes';

/** Line drawings in a 24 box. 1.75 line, square ends, mitred joins, no fills. */
const drawings = {
  search: 'M17 10.5a6.5 6.5 0 1 1-13 0a6.5 6.5 0 0 1 13 0zM15.5 15.5L21 21',
  basket: 'M4 9h16l-2 11H6zM8 9l3-6M16 9l-3-6',
  kits: 'M2 16v-4M22 16v-4M2 12a3.3 4 0 0 1 6.6 0a3.3 4 0 0 1 6.7 0a3.3 4 0 0 1 6.7 0',
  parts: 'M3 4h18v16H3zM3 9.3h18M3 14.6h18M10 6.7h4M10 12h4M10 17.3h4',
  bands: 'M2 17h20M4 17V9M8 17v-4M12 17V5M16 17v-4M20 17V9',
  guides: 'M12 6c-2-1.5-5-2-9-2v14c4 0 7 .5 9 2 2-1.5 5-2 9-2V4c-4 0-7 .5-9 2zM12 6v14',
  book: 'M5 3h14v18H5zM9 3v18M12 8h4M12 12h4',
  flag: 'M5 21V4h13l-3 4 3 4H5',
  box: 'M3 8l9-4 9 4v9l-9 4-9-4zM3 8l9 4 9-4M12 12v9',
  list: 'M9 5h12M9 12h12M9 19h12M3 4h2v2H3zM3 11h2v2H3zM3 18h2v2H3z',
  print: 'M7 9V3h10v6M7 17H3V9h18v8h-4M7 14h10v7H7z',
  truck: 'M2 6h12v11H2zM14 10h4l4 4v3h-8M6 20a2 2 0 1 0 0-4 2 2 0 0 0 0 4M18 20a2 2 0 1 0 0-4 2 2 0 0 0 0 4',
  lock: 'M5 11h14v10H5zM8 11V7a4 4 0 0 1 8 0v4',
  hand: 'M7 12V5.5a1.5 1.5 0 0 1 3 0V11M10 10V4a1.5 1.5 0 0 1 3 0v6M13 10V5a1.5 1.5 0 0 1 3 0v7M16 9a1.5 1.5 0 0 1 3 0v6c0 4-2.5 6-6 6-4 0-5-2-8-7-.6-1.2 1-2.5 2-1.5l2 2',
  plus: 'M12 4v16M4 12h16',
  minus: 'M4 12h16',
  arrow: 'M4 12h15M13 6l6 6-6 6',
  back: 'M20 12H5M11 6l-6 6 6 6',
  up: 'M12 20V5M6 11l6-6 6 6',
  down: 'M12 4v15M6 13l6 6 6-6',
  open: 'M6 9l6 6 6-6',
  check: 'M4 12.5l5.5 5.5L20 6.5',
  close: 'M5 5l14 14M19 5L5 19',
  user: 'M12 12a4.5 4.5 0 1 0 0-9a4.5 4.5 0 0 0 0 9zM3.5 21c0-4.5 3.5-6.5 8.5-6.5s8.5 2 8.5 6.5',
  out: 'M14 4H4v16h10M10 12h11M16 7l5 5-5 5',
  calendar: 'M3 5h18v16H3zM3 10h18M8 2v5M16 2v5',
  meter: 'M3 5h18v14H3zM6.5 15a6 6 0 0 1 11 0M12 15l3-5',
  pencil: 'M4 20l1-5L16 4l4 4L9 19zM13 7l4 4',
  bin: 'M4 6h16M9 6V3h6v3M6 6l1 15h10l1-15M10 10v7M14 10v7',
  undo: 'M9 5L4 10l5 5M4 10h10a6 6 0 0 1 0 12h-3',
  sheet: 'M5 2h10l4 4v16H5zM15 2v4h4M8 11h8M8 15h8',
  clock: 'M12 21a9 9 0 1 0 0-18a9 9 0 0 0 0 18zM12 7v5l4 3',
  scales: 'M12 3v18M6 21h12M4 7h16M4 7l-2 7h5zM20 7l-3 7h5z',
  letter: 'M2 5h20v14H2zM2 6l10 8 10-8',
  key: 'M8 16a5 5 0 1 0 0-9.9a5 5 0 0 0 0 9.9zM12.5 11H22v4M18 11v3',
  coin: 'M12 21a9 9 0 1 0 0-18a9 9 0 0 0 0 18zM15 8.5c-3-1.5-5-.5-5 2.5v5h5M8 12.5h5',
  camera: 'M3 7h5l2-3h4l2 3h5v13H3zM12 17a4 4 0 1 0 0-8a4 4 0 0 0 0 8z',
  download: 'M12 3v12M6 10l6 6 6-6M4 21h16',
  upload: 'M12 16V4M6 9l6-6 6 6M4 21h16',
  filter: 'M3 4h18l-7 9v7l-4-2v-5z',
  more: 'M5 12h.01M12 12h.01M19 12h.01',
} as const;

export type IconName = keyof typeof drawings;
export const iconNames = Object.keys(drawings);

export type IconProps = {
  name: IconName;
  /** Pixels; 20 beside body text, 24 in navigation. */
  size?: number;
  /** A name for readers, where no word stands beside the icon. Without one the icon is hidden from them. */
  label?: string;
  className?: string;
};

export function Icon({ name, size = 20, label, className }: IconProps) {
  return (
    <svg
      className={classes('shrink-0', className)}
      width={size}
      height={size}
      viewBox="0 0 24 24"
      fill="none"
      stroke="currentColor"
      strokeWidth={1.75}
      strokeLinecap="square"
      strokeLinejoin="miter"
      {...(label === undefined ? { 'aria-hidden': true } : { role: 'img', 'aria-label': label })}
    >
      <path d={drawings[name]} />
    </svg>
  );
}
