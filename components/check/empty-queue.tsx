import { Empty } from '@/components/ui/empty';
import { SvgDrawing } from '@/templates/drawings/as-svg';
import { partDrawing } from '@/templates/drawings/part-drawing';

export function EmptyQueue() {
  return (
    <div className="grid content-start bg-card px-4 py-8 sm:px-6">
      <h1 className="sr-only">Check room</h1>
      <Empty drawing={<SvgDrawing drawing={partDrawing('coil-tube')} width={90} />} title="Nothing waits">
        When a designer sends a version to check, it lands here, oldest first.
      </Empty>
    </div>
  );
}
