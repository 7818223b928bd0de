import type { Verdict } from '@/services/receiver';
import type { Finding } from '@/services/kits/rules';
import type { VersionContent } from '@/services/kits/schemas';
import type { ResponseSetting } from '@/components/charts/response-shape';

/** What the verdict worker is asked. Requests are numbered; an answer to an older one is dropped. */
export interface VerdictRequest {
  number: number;
  content: VersionContent;
  /** 0 for the first verdict, without the boxes. */
  boxes: number;
}

/** A version with a remedy's changes: what it is called, and what it comes to. */
export interface TriedRemedy {
  text: string;
  /** Finding that asks for it. */
  code: string;
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
  remedies: TriedRemedy[];
}

export type VerdictAnswer = { number: number; boxes: number } & (
  | { kind: 'verdict'; live: LiveVerdict }
  /** What has to be chosen first, a sentence each. */
  | { kind: 'lacks'; lacks: string[] }
  /** Values that cannot be, by their path in the design. */
  | { kind: 'invalid'; issues: { path: string; message: string }[] }
);
