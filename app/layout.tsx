import type { Metadata, Viewport } from 'next';
import type { ReactNode } from 'react';
import { faces } from '@/components/fonts';
import './globals.css';

export const metadata: Metadata = {
  title: { default: 'Coilyard', template: '%s: Coilyard' },
  description: 'Receiver kits that run on the signal itself, each version checked before it is sold.',
};

export const viewport: Viewport = { width: 'device-width', initialScale: 1 };

/** Rendered for each request: the content security policy gives every page its own nonce. */
export const dynamic = 'force-dynamic';

export default function RootLayout({ children }: { children: ReactNode }) {
  return (
    <html lang="en" className={faces}>
      <body>{children}</body>
    </html>
  );
}
