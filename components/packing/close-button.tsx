import { Button } from '@/components/ui/button';

export interface CloseButtonProps {
  reasons: readonly string[];
  isBusy: boolean;
  onClose: () => void;
}

/** "Close the box"; dashed and locked while anything is missing. The reasons stand above it, and are read out with it. */
export function CloseButton({ reasons, isBusy, onClose }: CloseButtonProps) {
  if (reasons.length > 0)
    return (
      <CloseLocked reason={reasons.length === 1 ? '1 thing to do' : `${reasons.length} things to do`} more={reasons} />
    );
  return (
    <Button variant="cream" size="floor" icon="lock" pending={isBusy} onClick={onClose} className="w-full">
      Close the box
    </Button>
  );
}

/** The locked button with how much is to go. */
export function CloseLocked({ reason, more = [] }: { reason: string; more?: readonly string[] }) {
  return (
    <span className="grid *:w-full">
      <Button size="floor" lockedReason={[reason, ...more].join('. ')} reasonSide="hidden" className="w-full px-3">
        <span className="grid gap-1 text-left leading-5">
          Close the box
          <span className="text-floor font-normal">{reason}</span>
        </span>
      </Button>
    </span>
  );
}
