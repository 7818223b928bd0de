import { existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';
import type Stripe from 'stripe';
import { z } from 'zod';
import type { Delivery } from './deliveries';
import type { Remembered } from './idempotency';
import type { PaymentAttempt } from './payments';

/** A session with what the provider knows of it and does not show. */
export interface SessionRecord {
  id: string;
  session: Stripe.Checkout.Session;
  lines: Stripe.LineItem[];
  forIntent: Pick<Stripe.PaymentIntent, 'description' | 'metadata' | 'receipt_email' | 'statement_descriptor'>;
  /** The payment that waits for the card holder's bank, or for `settle`. */
  attempt: PaymentAttempt | null;
}

interface Shelves {
  sessions: Map<string, SessionRecord>;
  intents: Map<string, Stripe.PaymentIntent>;
  charges: Map<string, Stripe.Charge>;
  refunds: Map<string, Stripe.Refund>;
  transactions: Map<string, Stripe.BalanceTransaction>;
  disputes: Map<string, Stripe.Dispute>;
  customers: Map<string, Stripe.Customer>;
  products: Map<string, Stripe.Product>;
  events: Map<string, Stripe.EventBase>;
  deliveries: Map<string, Delivery>;
  remembered: Map<string, Remembered>;
}

type Kept = { version: 1; ahead: number } & { [K in keyof Shelves]: [string, ReturnType<Shelves[K]['get']>][] };

const emptyShelves = (): Shelves => ({
  sessions: new Map(),
  intents: new Map(),
  charges: new Map(),
  refunds: new Map(),
  transactions: new Map(),
  disputes: new Map(),
  customers: new Map(),
  products: new Map(),
  events: new Map(),
  deliveries: new Map(),
  remembered: new Map(),
});

export class Store {
  shelves = emptyShelves();

  /** What the id stands for, whichever shelf it lies on. */
  find(id: string): object | undefined {
    const { sessions, intents, charges, refunds, transactions, disputes, customers, products, events } = this.shelves;
    const plain = [intents, charges, refunds, transactions, disputes, customers, products, events];
    return sessions.get(id)?.session ?? plain.find((shelf) => shelf.has(id))?.get(id);
  }

  clear(): void {
    this.shelves = emptyShelves();
  }

  /** Written beside and renamed, so that a stop in the middle leaves the older file whole. */
  save(file: string, ahead: number): void {
    const shelves = Object.entries(this.shelves).map(([name, shelf]) => [name, [...shelf]]);
    mkdirSync(dirname(file), { recursive: true });
    writeFileSync(`${file}.new`, JSON.stringify({ version: 1, ahead, ...Object.fromEntries(shelves) }));
    renameSync(`${file}.new`, file);
  }

  /** Gives back how far the clock was ahead. */
  load(file: string): number {
    if (!existsSync(file)) return 0;
    const kept = keptSchema.safeParse(parsed(readFileSync(file, 'utf8')));
    if (!kept.success)
      throw new Error(`The state file ${file} is not one of this stand-in. Delete it or name another.`);
    const { ahead, ...rest } = kept.data;
    this.shelves = {
      sessions: shelf(rest.sessions),
      intents: shelf(rest.intents),
      charges: shelf(rest.charges),
      refunds: shelf(rest.refunds),
      transactions: shelf(rest.transactions),
      disputes: shelf(rest.disputes),
      customers: shelf(rest.customers),
      products: shelf(rest.products),
      events: shelf(rest.events),
      deliveries: shelf(rest.deliveries),
      // A request cut off by the stop never gets its answer; its key is free again.
      remembered: shelf(rest.remembered.filter(([, one]) => one?.answer)),
    };
    return ahead;
  }
}

function shelf<T>(entries: [string, T | undefined][]): Map<string, T> {
  const filled = new Map<string, T>();
  for (const [id, held] of entries) if (held !== undefined) filled.set(id, held);
  return filled;
}

function parsed(json: string): unknown {
  try {
    return JSON.parse(json);
  } catch {
    return undefined;
  }
}

/** The file is this program's own: its version, clock and shelf names are checked, each object on a shelf is taken as written. */
const keptSchema = z.custom<Kept>((value) => {
  const outline = z.looseObject({ version: z.literal(1), ahead: z.number() }).safeParse(value);
  return outline.success && Object.keys(emptyShelves()).every((name) => Array.isArray(outline.data[name]));
});
