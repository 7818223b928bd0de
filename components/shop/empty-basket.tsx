import { Empty } from '@/components/ui/empty';
import { TextLink } from '@/components/ui/link-button';
import { SvgDrawing } from '@/templates/drawings/as-svg';
import { partDrawing } from '@/templates/drawings/part-drawing';

export function EmptyBasket() {
  return (
    <Empty title="Your basket is empty" drawing={<SvgDrawing drawing={partDrawing('box')} width={100} />}>
      Put a kit into it from <TextLink href="/">the catalogue</TextLink>. It keeps what you choose for sixty days.
    </Empty>
  );
}
