'use client';

import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { useRouter } from 'next/navigation';
import { useState, useSyncExternalStore } from 'react';
import type { Action } from '@/components/forms/action-result';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { ToastRegion, useToast } from '@/components/ui/toast';
import type { VersionId } from '@/services/ids';
import { contentMass, fieldOf, stopsIn, wireNeeded } from '@/services/kits/rules';
import type { LineView, StartVersion, VersionContent, VersionView } from '@/services/kits/schemas';
import type { PartView, Place } from '@/services/parts/schemas';
import type { ProblemView } from '@/services/problem';
import { ConflictPanel } from './conflict-panel';
import { findParts, otherPart } from './find-parts';
import { FootBar } from './foot-bar';
import { HeldPanel } from './held-panel';
import { LinesPane } from './lines-pane';
import { PhonePanes, sentenceOf } from './phone-panes';
import { nextReference, referenceLetters } from './places';
import { StateNotice } from './state-notice';
import { useVerdict } from './use-verdict';
import { VerdictPane } from './verdict-pane';
import type { TriedRemedy, VerdictAnswer } from './verdict-messages';
import { VersionHead } from './version-head';
import { type VersionDeeds, VersionStore } from './version-store';

export interface WorkbenchProps {
  view: VersionView;
  /** Who looks may change it; a draft only. */
  mayEdit: boolean;
  deeds: VersionDeeds & {
    sendToCheck: Action<{ versionId: VersionId; basedOn: number }, VersionView>;
    callBack: Action<{ versionId: VersionId }, VersionView>;
    startVersion: Action<StartVersion, { versionId: VersionId }>;
  };
}

/** One version on one screen: parts and circuit at the left, the live verdict at the right. */
export function Workbench(props: WorkbenchProps) {
  const [client] = useState(
    () => new QueryClient({ defaultOptions: { queries: { retry: 1, refetchOnWindowFocus: false } } }),
  );
  return (
    <QueryClientProvider client={client}>
      <ToastRegion>
        <Bench {...props} />
      </ToastRegion>
    </QueryClientProvider>
  );
}

function Bench({ view, mayEdit, deeds }: WorkbenchProps) {
  const [store] = useState(() => new VersionStore(view, deeds));
  const snapshot = useSyncExternalStore(store.subscribe, store.read, store.read);
  const { answer, trying } = useVerdict(snapshot.content);
  const [pane, setPane] = useState<'parts' | 'verdict'>('parts');
  const [problem, setProblem] = useState<ProblemView | null>(null);
  const [deed, setDeed] = useState<'send' | 'start' | 'back' | null>(null);
  const say = useToast();
  const router = useRouter();
  const { server, content, lines, save, conflict } = snapshot;
  const isDraft = server.state === 'draft';
  const canChange = isDraft && mayEdit;
  const findings = answer?.kind === 'verdict' ? answer.live.findings : [];
  const { kit } = content;
  const stops = stopsIn(findings).length;

  async function addLine(place: Place, part: PartView) {
    const letter = part.values.kind === 'coil-former' ? 'F' : referenceLetters[place];
    const reference = nextReference(
      letter,
      lines.map((line) => line.reference),
    );
    const quantity = firstQuantity(content, place, part);
    setProblem(await store.addLine({ versionId: server.id, place, partId: part.id, reference, quantity, note: '' }));
  }

  async function removeLine(line: LineView) {
    const failed = await store.removeLine(line.id);
    setProblem(failed);
    if (failed) return;
    const { place, partId, reference, quantity, note } = line;
    say({
      sentence: `${reference} is out of the version.`,
      onUndo: () =>
        void store.addLine({ versionId: server.id, place, partId, reference, quantity, note }).then(setProblem),
    });
  }

  async function applyRemedy({ change }: TriedRemedy) {
    const found = await findParts(change.wanted);
    if (!found.ok) {
      setProblem(found.problem);
      return;
    }
    setProblem(null);
    if (change.circuit !== content.circuit) store.changeCircuit(change.circuit);
    for (const [reference, quantity] of change.quantities) {
      const line = lines.find((one) => one.reference === reference);
      if (line) store.changeLine(line.id, { quantity });
    }
    for (const { place, part } of found.parts) {
      const line = lines.find((one) => one.place === place);
      if (line) store.changeLine(line.id, otherPart(part));
      else await addLine(place, part);
    }
  }

  async function send() {
    setDeed('send');
    await store.saveNow();
    const answered = await deeds.sendToCheck({ versionId: server.id, basedOn: store.read().server.saveNo });
    setDeed(null);
    setProblem(answered.ok ? null : answered.problem);
    if (answered.ok) router.refresh();
  }

  async function callBack() {
    setDeed('back');
    const answered = await deeds.callBack({ versionId: server.id });
    setDeed(null);
    setProblem(answered.ok ? null : answered.problem);
    if (answered.ok) router.refresh();
  }

  async function start() {
    setDeed('start');
    const answered = await deeds.startVersion({ kitId: server.kitId, fromVersionId: server.id });
    if (answered.ok) router.push(`/bench/${answered.value.versionId}`);
    else {
      setDeed(null);
      setProblem(answered.problem);
    }
  }

  const lockedReason = lockOf(answer, save.kind, conflict !== null);
  return (
    <main id="main" className="flex min-h-dvh flex-col md:h-dvh">
      <VersionHead
        view={server}
        page="parts"
        {...(mayEdit && { onStart: () => void start(), starting: deed === 'start' })}
      />
      <PhonePanes pane={pane} onPane={setPane} {...sentenceOf(answer, content.kit.band)} />
      <div className="grid flex-1 md:min-h-0 md:grid-cols-[minmax(0,5fr)_minmax(0,6fr)] lg:grid-cols-[minmax(0,560px)_minmax(0,1fr)]">
        <section
          aria-label="Parts and circuit"
          tabIndex={0}
          className={`${pane === 'parts' ? '' : 'hidden'} relative min-w-0 px-4 py-4 sm:px-6 md:block md:overflow-y-auto md:border-r md:border-rule`}
        >
          <div className="grid gap-4">
            {problem && (
              <Notice kind="stops" title="Not done" live="alert">
                {problem.sentence}
              </Notice>
            )}
            {conflict && <ConflictPanel conflict={conflict} onSettle={store.settle} />}
            {!isDraft && (
              <StateNotice
                view={server}
                onCallBack={mayEdit ? () => void callBack() : undefined}
                pending={deed === 'back'}
              />
            )}
            {server.held && <HeldPanel held={server.held} letter={server.letter} number={kit.number} />}
            <LinesPane
              snapshot={snapshot}
              findings={findings}
              errors={errorsOf(answer)}
              store={canChange ? store : undefined}
              onAdd={(place, part) => void addLine(place, part)}
              onRemove={(line) => void removeLine(line)}
            />
          </div>
        </section>
        <section
          aria-label="Verdict"
          tabIndex={0}
          className={`${pane === 'verdict' ? '' : 'hidden'} relative min-w-0 bg-card px-4 py-4 outline-offset-[-4px] sm:px-6 md:block md:overflow-y-auto`}
        >
          <VerdictPane
            content={content}
            answer={answer}
            trying={trying}
            {...(canChange && { onTry: (remedy) => void applyRemedy(remedy) })}
          />
        </section>
      </div>
      <FootBar
        costMinor={lines.reduce((sum, line) => sum + line.costMinor, 0)}
        massMilligrams={contentMass(content)}
        pieces={lines.reduce((sum, line) => sum + (line.part?.unit === 'each' ? line.quantity : 1), 0)}
        save={canChange ? save : null}
        onRetry={() => void store.saveNow()}
      >
        {canChange && <UndoButtons store={store} canUndo={snapshot.canUndo} canRedo={snapshot.canRedo} />}
        {canChange && lockedReason === undefined && stops > 0 && (
          <p className="text-caption text-ink2 max-sm:flex-1 max-sm:basis-32">
            {stops === 1
              ? 'One stop stands; the check room will hold it.'
              : `${stops} stops stand; the check room will hold it.`}
          </p>
        )}
        {canChange && (
          <Button
            variant="primary"
            lockedReason={lockedReason}
            reasonSide="before"
            pending={deed === 'send'}
            pendingLabel="Working it out on the server"
            onClick={() => void send()}
          >
            Send to check
          </Button>
        )}
      </FootBar>
    </main>
  );
}

/** One piece; for the wire of a coil what the winding takes, 3 % more, up to the next tenth of a metre. */
function firstQuantity(content: VersionContent, place: Place, part: PartView): number {
  if (part.unit === 'each') return 1;
  const line = { reference: '', place, quantity: 1, note: '', part };
  const needed = place === 'tuning coil' ? wireNeeded({ ...content, lines: [...content.lines, line] }) : null;
  return needed === null ? 1000 : Math.ceil(needed * 1.03 * 10) * 100;
}

function UndoButtons({ store, canUndo, canRedo }: { store: VersionStore; canUndo: boolean; canRedo: boolean }) {
  return (
    <>
      {canUndo && (
        <Button size="small" icon="undo" onClick={store.undo}>
          Undo
        </Button>
      )}
      {canRedo && (
        <Button size="small" onClick={store.redo}>
          Redo
        </Button>
      )}
    </>
  );
}

/** Why it cannot be sent yet, in words; undefined when it can. */
function lockOf(answer: VerdictAnswer | null, save: string, hasConflict: boolean): string | undefined {
  if (hasConflict) return 'Choose between the two values first.';
  if (save === 'failed') return 'Save it first.';
  if (answer?.kind === 'lacks') return answer.lacks[0] ?? 'Fill every place first.';
  if (answer?.kind === 'invalid') return 'Mend the values that cannot be worked out.';
  if (!answer) return 'The verdict is being worked out.';
  if (save !== 'saved') return 'Wait until it is saved.';
  return undefined;
}

function errorsOf(answer: VerdictAnswer | null): Record<string, string> {
  const errors: Record<string, string> = {};
  if (answer?.kind === 'invalid') {
    for (const { path, message } of answer.issues) {
      const field = fieldOf(path);
      if (field.kind === 'circuit') errors[field.setting] ??= message;
    }
  }
  if (answer?.kind === 'verdict') {
    for (const { path, message } of stopsIn(answer.live.findings)) {
      const field = fieldOf(path);
      if (field.kind === 'circuit' && field.setting === 'pitch') errors[field.setting] ??= message;
    }
  }
  return errors;
}
