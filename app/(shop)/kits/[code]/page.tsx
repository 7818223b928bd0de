import type { Metadata } from 'next';
import { cache } from 'react';
import { view } from '@/app/view';
import { Plate } from '@/components/devices/plate';
import { WindingMark } from '@/components/devices/winding-mark';
import { BoxList } from '@/components/shop/box-list';
import { BuyBox } from '@/components/shop/buy-box';
import { Cautions } from '@/components/shop/cautions';
import { CheckPanel } from '@/components/shop/check-panel';
import { GuidePreview } from '@/components/shop/guide-preview';
import { KitStage } from '@/components/shop/kit-stage';
import { ReadyWords } from '@/components/shop/ready-words';
import { TuningBand } from '@/components/shop/tuning-band';
import { earphoneWords, kHz, provideWords } from '@/components/shop/words';
import { Breadcrumbs } from '@/components/ui/breadcrumbs';
import { Facts, FigureText } from '@/components/ui/figure-text';
import { readKitPage } from '@/services/catalogue';
import { putInBasket } from '../../actions';

interface Props {
  params: Promise<{ code: string }>;
}

/** Once a request, for the title and the page. */
const load = cache((code: string) => view((actor) => readKitPage(actor, code)));

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const kit = await load((await params).code);
  return { title: `${kit.name}, No. ${kit.number}`, description: kit.summary };
}

export default async function KitPage({ params }: Props) {
  const kit = await load((await params).code);
  return (
    <main id="main">
      <div className="mx-auto max-w-page px-4 sm:px-6">
        <Breadcrumbs trail={[{ href: '/', label: 'Kits' }]} here={kit.name} />
        <div className="grid gap-x-11 gap-y-4 md:grid-cols-[minmax(0,1.25fr)_minmax(0,1fr)]">
          <KitStage shape={kit.shape} />
          <div>
            <div className="flex flex-wrap items-center gap-3.5">
              <Plate kit={kit.number} version={kit.letter} />
              <WindingMark state="released" />
            </div>
            <h1 className="mt-3 mb-1.5 font-display text-page">{kit.name}</h1>
            <p className="text-lead">{kit.summary}</p>
            <BuyBox
              name={kit.name}
              versionId={kit.versionId}
              prices={kit.prices}
              ready={kit.ready}
              onPut={putInBasket}
            />
            <div className="mt-3 border-b border-rule pb-3">
              <ReadyWords ready={kit.ready} isPriced={kit.prices.length > 0}>
                Prices include tax.
              </ReadyWords>
            </div>
            <Facts
              className="mt-3"
              facts={[
                { term: 'Tunes', value: <Tunes kit={kit} /> },
                { term: 'Listens with', value: earphoneWords(kit.box) },
                { term: 'You provide', value: provideWords(kit) },
                { term: 'Made for', value: kit.audience },
                { term: 'Age', value: `${kit.ageFrom} and over, with an adult for aerial, earth and hot tools` },
              ]}
            />
          </div>
        </div>
      </div>
      <TuningBand kit={kit} />
      <div className="mx-auto max-w-page px-4 py-8 sm:px-6">
        <div className="grid items-start gap-x-11 gap-y-8 md:grid-cols-[minmax(0,1fr)_minmax(0,26rem)]">
          <div className="grid gap-8">
            <BoxList box={kit.box} number={kit.number} letter={kit.letter} />
            <GuidePreview kit={kit} />
          </div>
          <CheckPanel kit={kit} />
        </div>
        <Cautions kit={kit} />
      </div>
    </main>
  );
}

function Tunes({ kit }: { kit: Awaited<ReturnType<typeof readKitPage>> }) {
  if (!kit.reach) return kit.bandName;
  const { lo, hi } = kit.reach.band;
  return (
    <>
      <FigureText value={kHz(lo)} /> to <FigureText value={kHz(hi)} unit="kHz" />, {kit.bandName}
    </>
  );
}
