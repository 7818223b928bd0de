import type { Action } from '@/components/forms/action-result';
import type {
  BoxView,
  ClaimBox,
  CloseBox,
  MarkPrinted,
  PutBack,
  Scan,
  ScanAnswer,
  TellEmpty,
  Weigh,
} from '@/services/packing/schemas';

/** What a packer can do with the box on the screen; the page hands the actions in. */
export interface BoxDeeds {
  claimBox: Action<ClaimBox, BoxView>;
  scan: Action<Scan, ScanAnswer>;
  putBack: Action<PutBack, BoxView>;
  tellEmpty: Action<TellEmpty, BoxView>;
  markPrinted: Action<MarkPrinted, BoxView>;
  weigh: Action<Weigh, BoxView>;
  closeBox: Action<CloseBox, BoxView>;
}
