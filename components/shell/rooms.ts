import type { Deed } from '@/services/access/can';
import type { IconName } from '@/components/ui/icon';

export interface Door {
  href: string;
  label: string;
  icon: IconName;
  /** Who may go in; a door that one may not open is not drawn. */
  deed: Deed;
}

/** The rooms of the yard, in the order in which a kit passes through them. */
export const rooms: readonly Door[] = [
  { href: '/bench', label: 'Bench', icon: 'kits', deed: 'version.edit' },
  { href: '/check', label: 'Check room', icon: 'meter', deed: 'version.check' },
  { href: '/store', label: 'Store', icon: 'parts', deed: 'stock.read' },
  { href: '/packing', label: 'Packing', icon: 'box', deed: 'box.list' },
  { href: '/desk', label: 'Desk', icon: 'calendar', deed: 'desk.read' },
];

/** What each room's own navigation leads to. */
export const benchDoors: readonly Door[] = [
  { href: '/bench', label: 'Kits', icon: 'kits', deed: 'kit.read-all' },
  { href: '/bench/parts', label: 'Parts', icon: 'parts', deed: 'part.read' },
  { href: '/bench/bands', label: 'Bands', icon: 'bands', deed: 'kit.read-all' },
];
export const checkDoors: readonly Door[] = [
  { href: '/check', label: 'Waiting', icon: 'clock', deed: 'version.check' },
  { href: '/check/released', label: 'Released', icon: 'check', deed: 'version.check' },
  { href: '/check/held', label: 'Held', icon: 'flag', deed: 'version.check' },
];
export const packingDoors: readonly Door[] = [
  { href: '/packing', label: 'Boxes', icon: 'box', deed: 'box.list' },
  { href: '/packing/pick-list', label: 'Pick list', icon: 'list', deed: 'box.list' },
  { href: '/packing/dispatch', label: 'Dispatch', icon: 'truck', deed: 'box.list' },
  { href: '/packing/trace', label: 'Trace', icon: 'search', deed: 'box.trace' },
];
export const storeDoors: readonly Door[] = [
  { href: '/store', label: 'On hand', icon: 'parts', deed: 'stock.read' },
  { href: '/store/receive', label: 'Receive', icon: 'download', deed: 'stock.receive' },
];
export const deskDoors: readonly Door[] = [
  { href: '/desk', label: 'Today', icon: 'calendar', deed: 'desk.read' },
  { href: '/desk/orders', label: 'Orders', icon: 'list', deed: 'order.list' },
  { href: '/desk/kits', label: 'Kits and prices', icon: 'kits', deed: 'price.set' },
  { href: '/desk/people', label: 'People', icon: 'user', deed: 'person.list' },
  { href: '/desk/changes', label: 'Record of changes', icon: 'book', deed: 'record.read' },
];
