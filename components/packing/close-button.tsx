import { Button } from '@/components/ui/button';

export interface CloseButtonProps {
  reasons: readonly string[];
  isBusy: boolean;
  onClose: () => void;
}

/** "Close the box", dashed and locked while anything is missing; every reason stands beside it. */
export function CloseButton({ reasons, isBusy, onClose }: CloseButtonProps) {
  if (reasons.length > 0) {
    return (
      <div className="rounded-control border-2 border-dashed border-edge bg-well px-4 py-3 text-ink">
        <Button size="floor" lockedReason={reasons.join(' ')} reasonSide="hidden" className="w-full">
          Close the box
        </Button>
        <ul className="mt-2 list-disc pl-6 leading-6">
          {reasons.map((reason) => (
            <li key={reason}>{reason}</li>
          ))}
        </ul>
      </div>
    );
  }
  return (
    <Button variant="cream" size="floor" icon="lock" pending={isBusy} onClick={onClose} className="w-full">
      Close the box
    </Button>
  );
}
