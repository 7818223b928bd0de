import { TerminalStrip } from '@/components/devices/terminal-strip';
import type { OrderView } from '@/services/orders/schemas';
import { showShortMoment } from './moments';

/** The order as a strip of screws: where its wire is fastened, it is done. */
export function OrderTimeline({ order }: { order: OrderView }) {
  const done = order.timeline.filter((stage) => stage.state !== 'waiting').length;
  return (
    <TerminalStrip
      label={`Where order ${order.number} stands`}
      done={done}
      isFinished={order.fulfilment === 'cancelled'}
      stages={order.timeline.map(({ name, at, note }) => ({
        name,
        when: at === null ? note : showShortMoment(at),
        ...(at !== null && { detail: note }),
      }))}
    />
  );
}
