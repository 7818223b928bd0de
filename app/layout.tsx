import type { Metadata, Viewport } from 'next';
import { headers } from 'next/headers';
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

export default async function RootLayout({ children }: { children: ReactNode }) {
  const nonce = (await headers()).get('x-nonce') ?? undefined;
  return (
    <html lang="en" className={faces}>
      <head>
        {/* Where react-aria looks for the nonce of the style element it adds. Browsers hide the attribute once read. */}
        <meta property="csp-nonce" nonce={nonce} suppressHydrationWarning />
      </head>
      <body>{children}</body>
    </html>
  );
}
