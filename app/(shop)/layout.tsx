import type { ReactNode } from 'react';
import { ShopBar } from '@/components/shell/shop-bar';
import { SkipLink } from '@/components/shell/skip-link';
import { countBasket } from '@/services/orders';
import { currentActor } from '@/services/people';
import { basketId } from './basket-cookie';

/** Buyers' pages: light whatever the system says. */
export default async function ShopLayout({ children }: { children: ReactNode }) {
  const actor = await currentActor();
  return (
    <div data-theme="light" className="flex min-h-dvh flex-col">
      <SkipLink />
      <ShopBar actor={actor} inBasket={await countBasket(actor, await basketId())} />
      <div className="flex-1">{children}</div>
      <footer className="mt-12 border-t border-rule">
        <p className="mx-auto max-w-page px-4 py-8 text-caption text-ink2 sm:px-6">
          Tuning says nothing of strength. What you hear depends on your aerial, your earth and the hour. Local codes
          and licensed practice rule wherever a wire goes up.
        </p>
      </footer>
    </div>
  );
}
