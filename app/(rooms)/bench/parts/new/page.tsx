import type { Metadata } from 'next';
import { view } from '@/app/view';
import { PartForm } from '@/components/bench/part-form';
import { Breadcrumbs } from '@/components/ui/breadcrumbs';
import { must } from '@/services/access';
import { addPart } from '../../actions';

export const metadata: Metadata = { title: 'Add a part' };

export default async function NewPartPage() {
  await view(async (actor) => must(actor, 'part.edit'));
  return (
    <main id="main" className="mx-auto max-w-desk px-4 py-6 sm:px-6">
      <Breadcrumbs trail={[{ label: 'Parts', href: '/bench/parts' }]} here="Add a part" />
      <h1 className="mt-2 mb-5 font-display text-page">Add a part</h1>
      <PartForm part={null} addPart={addPart} />
    </main>
  );
}
