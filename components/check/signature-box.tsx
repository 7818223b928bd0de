'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { WindingMark } from '@/components/devices/winding-mark';
import type { ActionResult } from '@/components/forms/action-result';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { TextArea } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { releaseBlockers } from '@/services/check/rules';
import type { VersionView } from '@/services/kits/schemas';
import type { ProblemView } from '@/services/problem';
import { showMoment } from '@/services/time';
import type { CheckSheetProps } from './sheet';

type Question = 'release' | 'hold' | 'withdraw';

/** The last thing on the sheet: the remark, and the decision that is signed. */
export function SignatureBox(props: CheckSheetProps & { reasons: Readonly<Record<string, string>> }) {
  const { sheet, reasons, mayWithdraw, hold, release, withdraw } = props;
  const { versionId, contentHash, state, findings, content, decision } = sheet;
  const [remark, setRemark] = useState('');
  const [question, setQuestion] = useState<Question | null>(null);
  const [isSending, setSending] = useState(false);
  const [problem, setProblem] = useState<ProblemView | null>(null);
  const router = useRouter();
  const name = `${content.kit.number} ${sheet.letter}`;
  const full = `${content.kit.name} ${name}`;

  async function decide(deed: () => Promise<ActionResult<VersionView>>) {
    setSending(true);
    const answer = await deed();
    setSending(false);
    setQuestion(null);
    setProblem(answer.ok ? null : answer.problem);
    if (answer.ok) {
      setRemark('');
      router.refresh();
    }
  }

  const blockers = releaseBlockers({ state, contentHash, readHash: contentHash, findings, reasons: { ...reasons } });
  const remarkSentence = problem?.fields?.['remark'] ?? problem?.fields?.['reason'];
  const isRemarkShort = remark.trim().length < 10;
  return (
    <Panel ground="sign" aria-label="Signature">
      <div className="mb-3 flex flex-wrap items-center gap-3">
        <WindingMark state={state} />
        {decision && (
          <span className="ml-auto text-caption text-ink2">{`${decision.by}, ${showMoment(decision.at)}`}</span>
        )}
      </div>
      {problem && !remarkSentence && (
        <Notice kind="stops" title="Not signed" live="alert" className="mb-3">
          {problem.sentence}
        </Notice>
      )}
      {decision && decision.remark !== '' && (
        <p className="mb-3 font-signature text-lead whitespace-pre-line">{decision.remark}</p>
      )}

      {state === 'in-check' && !sheet.mayJudge && (
        <p>
          {sheet.own
            ? 'You worked on this version, so another checker judges it.'
            : 'A checker who has not worked on it judges it.'}
        </p>
      )}
      {state === 'in-check' && sheet.mayJudge && (
        <>
          <TextArea
            label="Remark"
            hint="Goes to everybody who worked on it. Holding asks for one."
            rows={3}
            maxLength={1000}
            value={remark}
            onChange={(event) => setRemark(event.target.value)}
            error={remarkSentence}
          />
          <div className="mt-4 flex flex-wrap items-start gap-3">
            <Button
              variant={blockers.length > 0 ? 'primary' : 'plain'}
              {...(isRemarkShort && { lockedReason: 'Write what has to change.', reasonSide: 'below' as const })}
              onClick={() => setQuestion('hold')}
            >
              Hold and send back
            </Button>
            <Button
              variant="primary"
              {...(blockers.length > 0 && { lockedReason: blockers.join(' '), reasonSide: 'below' as const })}
              onClick={() => setQuestion('release')}
            >
              {`Release ${name}`}
            </Button>
          </div>
        </>
      )}
      {state === 'released' && mayWithdraw && (
        <>
          <TextArea
            label="Why it is withdrawn"
            hint="Stays in the record of changes."
            rows={2}
            maxLength={1000}
            value={remark}
            onChange={(event) => setRemark(event.target.value)}
            error={remarkSentence}
          />
          <div className="mt-4">
            <Button
              variant="danger"
              {...(isRemarkShort && { lockedReason: 'Give the reason first.', reasonSide: 'after' as const })}
              onClick={() => setQuestion('withdraw')}
            >
              {`Withdraw ${name}`}
            </Button>
          </div>
        </>
      )}

      <Dialog
        isOpen={question === 'release'}
        onClose={() => setQuestion(null)}
        title={`Release ${full}?`}
        answers={
          <>
            <Button
              variant="primary"
              pending={isSending}
              pendingLabel="Working it out once more"
              onClick={() => void decide(() => release({ versionId, contentHash, reasons: { ...reasons }, remark }))}
            >
              {`Release ${name}`}
            </Button>
            <Button onClick={() => setQuestion(null)}>Not yet</Button>
          </>
        }
      >
        It can be sold and packed from now on. Its parts and guide can no longer be changed.
      </Dialog>
      <Dialog
        isOpen={question === 'hold'}
        onClose={() => setQuestion(null)}
        title={`Hold ${full}?`}
        answers={
          <>
            <Button
              variant="primary"
              pending={isSending}
              pendingLabel="Sending it back"
              onClick={() => void decide(() => hold({ versionId, contentHash, remark }))}
            >
              Hold and send back
            </Button>
            <Button onClick={() => setQuestion(null)}>Not yet</Button>
          </>
        }
      >
        It stays as it is and cannot be released any more. Its designers get your remark and answer with a new version.
      </Dialog>
      <Dialog
        isOpen={question === 'withdraw'}
        onClose={() => setQuestion(null)}
        title={`Withdraw ${full}?`}
        answers={
          <>
            <Button
              variant="danger"
              pending={isSending}
              pendingLabel="Withdrawing it"
              onClick={() => void decide(() => withdraw({ versionId, reason: remark }))}
            >
              {`Withdraw ${name}`}
            </Button>
            <Button onClick={() => setQuestion(null)}>Not yet</Button>
          </>
        }
      >
        Nobody can buy it any more, and that cannot be taken back. Old orders go on showing it.
      </Dialog>
    </Panel>
  );
}
