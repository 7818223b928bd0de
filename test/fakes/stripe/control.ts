import { z } from 'zod';
import { dispute, settle } from './payments';
import { allOff, API_FAULTS, switchesSchema, type Switches } from './switches';
import type { World } from './world';

/** The switches as a running stand-in offers them over HTTP: `POST /_control` with one of these as JSON. */
export const controlSchema = z.discriminatedUnion('do', [
  z.strictObject({ do: z.literal('set'), switches: switchesSchema.partial() }),
  z.strictObject({
    do: z.literal('fail'),
    fault: z.enum(API_FAULTS),
    times: z.number().int().min(1).default(1),
    path: z.string().optional(),
  }),
  z.strictObject({ do: z.literal('deliver'), event: z.string() }),
  z.strictObject({ do: z.literal('deliveries') }),
  z.strictObject({ do: z.literal('advance'), ms: z.number().int().min(0) }),
  z.strictObject({ do: z.literal('settle'), session: z.string(), outcome: z.enum(['succeeded', 'failed']) }),
  z.strictObject({ do: z.literal('dispute'), payment: z.string(), reason: z.string().default('fraudulent') }),
  z.strictObject({ do: z.literal('reset') }),
]);
export type ControlOrder = z.output<typeof controlSchema>;

export async function control(world: World, order: ControlOrder): Promise<object> {
  switch (order.do) {
    case 'set':
      setSwitches(world, order.switches);
      return { switches: world.switches };
    case 'fail':
      world.faults.add(order);
      return { planned: order.times };
    case 'deliver':
      return world.deliveries.again(order.event);
    case 'deliveries':
      return { deliveries: world.deliveries.list() };
    case 'advance':
      world.clock.advance(order.ms);
      return { now: world.clock.now() };
    case 'settle':
      settle(world, order.session, order.outcome);
      return { session: order.session };
    case 'dispute':
      return dispute(world, order.payment, order.reason);
    case 'reset':
      reset(world);
      return { switches: world.switches };
  }
}

export function setSwitches(world: World, wanted: { [K in keyof Switches]?: Switches[K] | undefined }): void {
  const named = Object.fromEntries(Object.entries(wanted).filter(([, value]) => value !== undefined));
  Object.assign(world.switches, named);
  world.deliveries.release();
}

/** As freshly started, at the same address and with the clock right again. */
export function reset(world: World): void {
  world.clock.stop();
  world.clock.ahead = 0;
  world.store.clear();
  world.faults.clear();
  world.deliveries.clear();
  Object.assign(world.switches, allOff());
}
