import type { Part } from './letter';

/** What a mail about a decision of the check room shows. */
export interface VersionMailView {
  name: string;
  kitName: string;
  letter: string;
  /** The checker's words; empty when there are none. */
  remark: string;
  link: string;
}

export const remarkOf = ({ remark }: VersionMailView): Part[] =>
  remark === '' ? [] : [{ line: `The checker writes: ${remark}` }];
