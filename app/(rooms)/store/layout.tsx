import type { ReactNode } from 'react';
import { enter } from '@/app/view';
import { Dock } from '@/components/shell/dock';
import { storeDoors } from '@/components/shell/rooms';
import { SkipLink } from '@/components/shell/skip-link';

/** Floor density, light whatever the system says: tablets stand under lamps. */
export default async function StoreLayout({ children }: { children: ReactNode }) {
  return (
    <div data-theme="light" className="flex h-dvh flex-col text-floor">
      <SkipLink />
      <div className="relative min-h-0 flex-1 overflow-y-auto">{children}</div>
      <Dock label="Store" doors={storeDoors} actor={await enter('stock.read')} />
    </div>
  );
}
