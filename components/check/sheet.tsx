'use client';

import { useState } from 'react';
import { ReachRail } from '@/components/charts/reach-rail';
import { ReachTable } from '@/components/charts/reach-table';
import { Plate } from '@/components/devices/plate';
import { LinkButton } from '@/components/ui/link-button';
import type { Action } from '@/components/forms/action-result';
import type { Hold, Release, Sheet, Withdraw } from '@/services/check/schemas';
import type { VersionView } from '@/services/kits/schemas';
import { showMoment } from '@/services/time';
import { DifferenceList } from './difference-list';
import { FindingsColumn } from './findings-column';
import { SheetFacts } from './sheet-facts';
import { SignatureBox } from './signature-box';

export interface CheckSheetProps {
  sheet: Sheet;
  mayWithdraw: boolean;
  hold: Action<Hold, VersionView>;
  release: Action<Release, VersionView>;
  withdraw: Action<Withdraw, VersionView>;
}

/** The check sheet: rail, findings with the reasons for notes, facts of the version, and the signature last. */
export function CheckSheet({ sheet, mayWithdraw, hold, release, withdraw }: CheckSheetProps) {
  const [reasons, setReasons] = useState<Record<string, string>>(sheet.decision?.reasons ?? {});
  const { kit, circuit } = sheet.content;
  const canSign = sheet.state === 'in-check' && sheet.mayJudge;
  const rail = {
    band: kit.band,
    nominal: sheet.verdict.reach.nominal,
    worst: sheet.verdict.reach.corners,
    contour: sheet.contour,
    stations: circuit.place.stations,
  };
  return (
    <div className="min-w-0 bg-card px-4 py-4 sm:px-6">
      <div className="mb-5 flex flex-wrap items-center gap-x-4 gap-y-2">
        <Plate kit={kit.number} version={sheet.letter} />
        <h1 className="font-display text-section sm:text-[34px] sm:leading-10">{kit.name}</h1>
        <p className="text-caption text-ink2">
          {`Sent to check by ${sheet.sentBy}, ${showMoment(sheet.sentAt)}.`}
          <br />
          {basisWords(sheet)}
        </p>
        <LinkButton href={`/bench/${sheet.versionId}`} className="ml-auto" size="small">
          Open on the bench
        </LinkButton>
      </div>
      <ReachRail {...rail} size="front" showSpare />
      <div className="mt-1 border-b-2 border-ink pb-3">
        <ReachTable {...rail} />
      </div>
      <div className="mt-4 grid gap-x-8 gap-y-6 xl:grid-cols-2">
        <FindingsColumn
          sheet={sheet}
          reasons={reasons}
          {...(canSign && { onReason: (key, text) => setReasons({ ...reasons, [key]: text }) })}
        />
        <div className="grid content-start gap-6 xl:sticky xl:top-4 xl:self-start">
          <SheetFacts sheet={sheet} />
          {sheet.basedOn && (
            <DifferenceList letter={`${kit.number} ${sheet.basedOn.letter}`} differences={sheet.basedOn.differences} />
          )}
          <SignatureBox
            sheet={sheet}
            reasons={reasons}
            mayWithdraw={mayWithdraw}
            hold={hold}
            release={release}
            withdraw={withdraw}
          />
        </div>
      </div>
    </div>
  );
}

function basisWords({ basedOn, content, editors }: Sheet): string {
  const who = `Worked on by ${editors.join(', ')}.`;
  if (!basedOn) return who;
  const count = basedOn.differences.length;
  const differs = count === 0 ? 'Nothing differs' : count === 1 ? 'One thing differs' : `${count} things differ`;
  return `${differs} from ${content.kit.number} ${basedOn.letter}. ${who}`;
}
