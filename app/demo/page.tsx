import type { Metadata } from 'next';
import Link from 'next/link';
import { view } from '@/app/view';
import { DemoPeople } from '@/components/account/demo-people';
import { Wordmark } from '@/components/devices/wordmark';
import { listDemoPeople } from '@/services/people';

export const metadata: Metadata = { title: 'Demo sign-ins', robots: { index: false } };

export default async function DemoPage() {
  const people = await view(listDemoPeople);
  const of = (kind: 'staff' | 'customer') => people.filter(({ person }) => person.kind === kind);
  return (
    <div data-theme="light" className="min-h-dvh">
      <header className="mx-auto max-w-page px-4 py-5 sm:px-6">
        <Link href="/" className="inline-block">
          <Wordmark />
        </Link>
      </header>
      <main id="main" className="mx-auto max-w-page px-4 pt-8 pb-16 sm:px-6">
        <h1 className="font-display text-page">Who comes in?</h1>
        <p className="mt-2 mb-6 max-w-measure text-lead">
          This is a demo with invented people. One press signs you in as one of them, without a password.
        </p>
        <DemoPeople staff={of('staff')} customers={of('customer')} />
      </main>
    </div>
  );
}
