import { z } from 'zod';

/**
 * Every mail the product sends, and what its row in the outbox holds: ids, no tokens and no text. The worker reads a
 * fresh view when it writes the mail.
 */
export const payloads = {
  'sign-in-link': z.strictObject({ linkId: z.string() }),
  /** Somebody asked for a link that cannot be given; the answer on screen was the same as for one that can. */
  'no-link': z.strictObject({ email: z.string(), reason: z.enum(['no-account', 'staff']) }),
  invitation: z.strictObject({ invitationId: z.string() }),
  'account-changed': z.strictObject({ personId: z.string(), change: z.enum(['password', 'roles', 'way-in']) }),
  'order-confirmed': z.strictObject({ orderId: z.string(), link: z.string().optional() }),
  'order-backordered': z.strictObject({ orderId: z.string() }),
  'order-shipped': z.strictObject({ orderId: z.string(), shipmentId: z.string() }),
  'version-held': z.strictObject({ versionId: z.string() }),
  'version-released': z.strictObject({ versionId: z.string() }),
} as const;

export type MailKind = keyof typeof payloads;
export type MailPayload<K extends MailKind> = z.infer<(typeof payloads)[K]>;

/** What a row of the outbox says about its mail. */
export const MailJob = z.object({ mail: z.string(), of: z.unknown() });
