import { z } from 'zod';
import { VersionId } from '../ids';
import type { Verdict } from '../receiver';
import type { Difference, Finding } from '../kits/rules';
import type { VersionContent, VersionState } from '../kits/schemas';

const Hash = z.string().regex(/^[0-9a-f]{64}$/, 'This is not a content hash.');

export const SendToCheck = z.strictObject({ versionId: VersionId, basedOn: z.int() });
export type SendToCheck = z.infer<typeof SendToCheck>;
export const CallBack = z.strictObject({ versionId: VersionId });
export type CallBack = z.infer<typeof CallBack>;

export const Hold = z.strictObject({
  versionId: VersionId,
  contentHash: Hash,
  remark: z
    .string()
    .trim()
    .min(10, 'Say in at least 10 characters what has to change.')
    .max(1000, 'Keep it under 1000 characters.'),
});
export type Hold = z.infer<typeof Hold>;

export const Release = z.strictObject({
  versionId: VersionId,
  contentHash: Hash,
  /** The checker's reason for each note finding, by `findingKey`. */
  reasons: z.record(z.string(), z.string().trim().max(500, 'Keep a reason under 500 characters.')),
  remark: z.string().trim().max(1000, 'Keep it under 1000 characters.').default(''),
});
export type Release = z.input<typeof Release>;

export const Withdraw = z.strictObject({
  versionId: VersionId,
  reason: z
    .string()
    .trim()
    .min(10, 'Say in at least 10 characters why it is withdrawn.')
    .max(1000, 'Keep it under 1000 characters.'),
});
export type Withdraw = z.infer<typeof Withdraw>;

/** One row of the queue, or of the lists of what was decided. */
export interface QueueEntry {
  versionId: VersionId;
  kitNumber: number;
  kitName: string;
  letter: string;
  state: VersionState;
  band: VersionContent['kit']['band'];
  reach: Verdict['reach'] | null;
  sentBy: string;
  sentAt: number;
  /** The reader worked on it, so somebody else has to judge it. */
  own: boolean;
  /** Of a decided version: who, when and the remark. */
  decision: { by: string; at: number; remark: string } | null;
}

export interface Queue {
  /** In check, oldest first. */
  waiting: QueueEntry[];
  /** Held, newest first. */
  held: QueueEntry[];
}

/** A rule that clears, with the figure it clears by. */
export interface Cleared {
  code: string;
  title: string;
  text: string;
  figure: string;
}

export interface SignOff {
  by: string;
  at: number;
  contentHash: string;
  engineVersion: string;
  rulesVersion: string;
  verdict: Verdict;
  reasons: Record<string, string>;
}

/** The check sheet: everything a checker judges by, worked out on the server from the frozen content. */
export interface Sheet {
  versionId: VersionId;
  state: VersionState;
  letter: string;
  content: VersionContent;
  contentHash: string;
  sentBy: string;
  sentAt: number;
  editors: string[];
  own: boolean;
  mayJudge: boolean;
  verdict: Verdict;
  contour: { f: number[]; share: number[] } | null;
  findings: Finding[];
  cleared: Cleared[];
  /** Against the version it was started from. */
  basedOn: { letter: string; differences: Difference[] } | null;
  decision: {
    kind: 'released' | 'held' | 'withdrawn';
    by: string;
    at: number;
    remark: string;
    reasons: Record<string, string>;
  } | null;
}
