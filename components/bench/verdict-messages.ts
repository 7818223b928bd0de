import type { Verdict } from '@/services/receiver';
import type { Finding, VersionChange } from '@/services/kits/rules';
import type { VersionContent } from '@/services/kits/schemas';
import type { ResponseSetting } from '@/components/charts/response-shape';

/** What the verdict worker is asked. Requests are numbered; an answer to an older one is dropped. */
export interface VerdictRequest {
  number: number;
  content: VersionContent;
  /** 0 for the first verdict, without the boxes. */
  boxes: number;
}

/** A way to mend a finding: its sentence, what it does to the version, and what that comes to. */
export interface TriedRemedy {
  text: string;
  /** Finding that asks for it. */
  code: string;
  change: VersionChange;
  /** Null where the set stays as it is and only a quantity changes. */
  reach: Verdict['reach'] | null;
  /** What it leaves unmended, or spoils: a sentence each. */
  stops: string[];
}

export interface LiveVerdict {
  verdict: Verdict;
  findings: Finding[];
  contour: { f: number[]; share: number[] } | null;
  settings: ResponseSetting[];
  /** Null in a first answer: they are looked for with the boxes. */
  remedies: TriedRemedy[] | null;
}

export type VerdictAnswer = { number: number; boxes: number } & (
  | { kind: 'verdict'; live: LiveVerdict }
  /** What has to be chosen first, a sentence each. */
  | { kind: 'lacks'; lacks: string[] }
  /** Values that cannot be, by their path in the design. */
  | { kind: 'invalid'; issues: { path: string; message: string }[] }
);
