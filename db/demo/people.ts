import type { Role } from '@/services/access';

/** The invented people of the yard and its invented buyers. Nobody real is meant. */
export const staff: { name: string; email: string; roles: Role[] }[] = [
  { name: 'Maud Orrin', email: 'maud@coilyard.example', roles: ['owner'] },
  { name: 'Isolde Hark', email: 'isolde@coilyard.example', roles: ['designer'] },
  { name: 'Piers Lindow', email: 'piers@coilyard.example', roles: ['designer', 'checker'] },
  { name: 'Walter Tarrow', email: 'walter@coilyard.example', roles: ['checker'] },
  { name: 'Bryn Orne', email: 'bryn@coilyard.example', roles: ['packer'] },
  { name: 'Tilda Marsh', email: 'tilda@coilyard.example', roles: ['packer'] },
];

export const customers: { name: string; email: string }[] = [
  { name: 'Edda Holm', email: 'edda@hollin-road.example' },
  { name: 'Jonas Veck', email: 'jonas@veck.example' },
  { name: 'Ruth Askew', email: 'ruth@pellstow-school.example' },
  { name: 'Omar Penhale', email: 'omar@penhale.example' },
];

export interface DemoAddress {
  organisation?: string;
  lines: string[];
  town: string;
  postcode: string;
  country: string;
}

export const addresses: DemoAddress[] = [
  {
    organisation: 'Hollin Road Radio Club',
    lines: ['The Old Drill Hall', 'Hollin Road'],
    town: 'Osk Bridge',
    postcode: 'OB4 2HR',
    country: 'GB',
  },
  { lines: ['7 Ferry Row'], town: 'Pellstow', postcode: 'PW1 7FR', country: 'GB' },
  {
    organisation: 'Pellstow Upper School',
    lines: ['Science block', 'Mill Lane'],
    town: 'Pellstow',
    postcode: 'PW3 1ML',
    country: 'GB',
  },
  { lines: ['19 Cantred Street', 'Flat 2'], town: 'North Cantred', postcode: 'NC2 9CS', country: 'GB' },
  { lines: ['Quay House'], town: 'Harbour Cross', postcode: 'HC1 1QH', country: 'GB' },
];

/** Stations of the invented coast, with the field at Pellstow in V/m. */
export const stations = [
  { name: 'Osk Home', f: 549_000, field: 0.022 },
  { name: 'Harbour', f: 612_000, field: 0.009 },
  { name: 'Vale', f: 702_000, field: 0.006 },
  { name: 'Sluice', f: 747_000, field: 0.014 },
  { name: 'North Cantred', f: 846_000, field: 0.011 },
  { name: 'Hill Service', f: 954_000, field: 0.017 },
  { name: 'Osk Light', f: 1_071_000, field: 0.02 },
  { name: 'Ferry', f: 1_197_000, field: 0.005 },
  { name: 'Downs', f: 1_341_000, field: 0.008 },
  { name: 'Old Mill', f: 1_458_000, field: 0.007 },
  { name: 'Cape', f: 1_593_000, field: 0.012 },
];

export const longWaveStations = [
  { name: 'Great Fen', f: 162_000, field: 0.018 },
  { name: 'Northern Mast', f: 198_000, field: 0.024 },
  { name: 'Strand', f: 234_000, field: 0.007 },
  { name: 'Outer Bank', f: 270_000, field: 0.005 },
];
