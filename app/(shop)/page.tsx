import type { Metadata } from 'next';
import { view } from '@/app/view';
import { FrontReach } from '@/components/shop/front-reach';
import { HowChecked } from '@/components/shop/how-checked';
import { KitCard } from '@/components/shop/kit-card';
import { Poster } from '@/components/shop/poster';
import { SearchBox } from '@/components/shop/search-box';
import { inWords } from '@/components/shop/words';
import { Empty } from '@/components/ui/empty';
import { TextLink } from '@/components/ui/link-button';
import { listOnSale, readKitPage } from '@/services/catalogue';

interface Props {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

const searched = async ({ searchParams }: Props): Promise<string> => {
  const asked = (await searchParams)['q'];
  return typeof asked === 'string' ? asked.trim().slice(0, 80) : '';
};

export async function generateMetadata(props: Props): Promise<Metadata> {
  const q = await searched(props);
  return q === '' ? {} : { title: `Kits that match ‘${q}’` };
}

/** The catalogue: a poster, the newest kit's reach, and a card for each kit on sale. */
export default async function CataloguePage(props: Props) {
  const q = await searched(props);
  const { kits } = await view((actor) => listOnSale(actor, { q }));
  const newest = kits.find((kit) => kit.prices.length > 0 && kit.ready > 0) ?? kits[0];
  const front = newest && q === '' ? await view((actor) => readKitPage(actor, newest.code)) : null;
  return (
    <main id="main">
      {q === '' && <Poster kits={kits} newest={newest} />}
      {front && <FrontReach kit={front} />}
      <div id="kits" className="mx-auto max-w-page px-4 py-8 sm:px-6">
        <div className="mb-4 flex flex-wrap items-baseline justify-between gap-x-6 gap-y-2">
          {q === '' ? (
            <h2 className="font-display text-section lg:text-verdict">
              {inWords(kits.length)} {kits.length === 1 ? 'kit' : 'kits'}, each checked before release
            </h2>
          ) : (
            <>
              <h1 className="font-display text-section lg:text-verdict">
                {inWords(kits.length)} {kits.length === 1 ? 'kit matches' : 'kits match'} ‘{q}’
              </h1>
              <TextLink href="/" bold>
                Show all kits
              </TextLink>
            </>
          )}
        </div>
        <div className="mb-4 sm:hidden">
          <SearchBox q={q} />
        </div>
        {kits.length > 0 ? (
          <ul className="grid gap-6 sm:grid-cols-2 lg:grid-cols-4">
            {kits.map((kit) => (
              <KitCard key={kit.kitId} kit={kit} level={q === '' ? 3 : 2} />
            ))}
          </ul>
        ) : q === '' ? (
          <Empty title="Nothing is on sale yet">
            When a checker releases the first version, it stands here with its reach and its price.
          </Empty>
        ) : (
          <Empty title="Try another word">
            Look by a kit’s name or number, by a station, or by its frequency in kHz, such as 846.
          </Empty>
        )}
        <HowChecked />
      </div>
    </main>
  );
}
