import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { TextLink } from '@/components/ui/link-button';
import type { VersionView } from '@/services/kits/schemas';
import { showMoment } from '@/services/time';

/** Why nothing can be changed here, and the way on. */
export function StateNotice({
  view,
  onCallBack,
  pending,
}: {
  view: VersionView;
  onCallBack?: (() => void) | undefined;
  pending: boolean;
}) {
  const name = `${view.content.kit.number} ${view.letter}`;
  const sheet = (
    <TextLink href={`/check/${view.id}`} className="text-ink!">
      Read its check sheet
    </TextLink>
  );
  switch (view.state) {
    case 'draft':
      return null;
    case 'in-check':
      return (
        <Notice
          kind="info"
          title={`${name} waits in check`}
          actions={
            <>
              {onCallBack && (
                <Button size="small" onClick={onCallBack} pending={pending}>
                  {`Call ${name} back`}
                </Button>
              )}
              {sheet}
            </>
          }
        >
          {`Sent ${view.sentAt === null ? '' : showMoment(view.sentAt)}. It keeps its content until somebody has judged it.`}
        </Notice>
      );
    case 'held':
      return (
        <Notice kind="stops" title={`${name} is held`} actions={sheet}>
          Start the next version from here to mend it.
        </Notice>
      );
    case 'released':
      return (
        <Notice kind="clears" title={`${name} is released`} actions={sheet}>
          It can be sold and packed, and no longer changes. Start the next version from here to better it.
        </Notice>
      );
    case 'withdrawn':
      return (
        <Notice kind="info" title={`${name} is withdrawn`} actions={sheet}>
          It is no longer sold; old orders go on showing it.
        </Notice>
      );
  }
}
