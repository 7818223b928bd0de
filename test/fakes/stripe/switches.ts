import { z } from 'zod';

/** What a test can set wrong about deliveries and payments; everything is off at the start. */
export const switchesSchema = z.strictObject({
  /** Every API answer waits this long; the idempotency key is in use meanwhile. */
  apiDelayMs: z.number().int().min(0),
  webhookDelayMs: z.number().int().min(0),
  /** Extra deliveries of each event, sent at the same time. */
  duplicate: z.number().int().min(0),
  /** Events are kept until this many wait, then sent last first; back to 0 sends what waits. */
  reorder: z.number().int().min(0),
  /** This many of the next events are never sent by themselves. */
  dropNext: z.number().int().min(0),
  /** Every n-th event is never sent by itself; 0 drops none. */
  dropEvery: z.number().int().min(0),
  /** Events wait until this is false again. */
  hold: z.boolean(),
  /** This many of the next payments complete unpaid, as a bank debit does, until `settle` says how they end. */
  settleLateNext: z.number().int().min(0),
});
export type Switches = z.infer<typeof switchesSchema>;

export const allOff = (): Switches => ({
  apiDelayMs: 0,
  webhookDelayMs: 0,
  duplicate: 0,
  reorder: 0,
  dropNext: 0,
  dropEvery: 0,
  hold: false,
  settleLateNext: 0,
});

/**
 * What can go wrong with one API call.
 * error-500: nothing is done, the answer is remembered under the idempotency key. outage-503 and rate-limit-429: nothing
 * is done or remembered. reset, silent: the connection breaks or stays quiet before the work; work-then-...: after it.
 * half-body: the work is done and half of the answer arrives. wrong-json: nothing is done, a page of HTML arrives.
 * none: this call goes well (to place a fault on a later one).
 */
export const API_FAULTS = [
  'none',
  'error-500',
  'outage-503',
  'rate-limit-429',
  'reset',
  'silent',
  'work-then-reset',
  'work-then-silent',
  'half-body',
  'wrong-json',
] as const;
export type ApiFault = (typeof API_FAULTS)[number];

export interface PlannedFault {
  fault: ApiFault;
  times: number;
  /** Only calls whose path begins so; all calls when it is absent. */
  path?: string | undefined;
}

export class FaultPlan {
  private planned: PlannedFault[] = [];

  add(plan: PlannedFault): void {
    this.planned.push({ ...plan });
  }

  clear(): void {
    this.planned = [];
  }

  next(path: string): ApiFault {
    const plan = this.planned.find((one) => one.times > 0 && path.startsWith(one.path ?? ''));
    if (!plan) return 'none';
    plan.times -= 1;
    return plan.fault;
  }
}
