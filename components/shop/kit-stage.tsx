import type { KitShape } from '@/services/catalogue/schemas';
import { SvgDrawing } from '@/templates/drawings/as-svg';
import { stageDrawing } from '@/templates/drawings/kit-drawing';
import { lookOf } from './kit-look';

/** The kit put together on its board. The facts beside it say in words what it shows. */
export function KitStage({ shape }: { shape: KitShape }) {
  return (
    <div className="grid place-items-center self-start border-rule bg-well max-sm:-mx-4 max-sm:border-b sm:rounded-panel sm:border">
      <SvgDrawing
        drawing={stageDrawing(lookOf(shape), { callouts: false })}
        className="block h-auto max-h-64 w-full sm:max-h-109"
      />
    </div>
  );
}
