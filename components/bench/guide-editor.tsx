'use client';

import { useRouter } from 'next/navigation';
import { useState, useSyncExternalStore } from 'react';
import type { Action } from '@/components/forms/action-result';
import { Button } from '@/components/ui/button';
import { Checkbox } from '@/components/ui/checkbox';
import { TextArea } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { ToastRegion, useToast } from '@/components/ui/toast';
import type { VersionId } from '@/services/ids';
import { cautionNote, cautions } from '@/services/kits/cautions';
import { contentMass, versionFindings } from '@/services/kits/rules';
import { CautionCode, type Guide, type GuideStep, type StartVersion, type VersionView } from '@/services/kits/schemas';
import { ConflictPanel } from './conflict-panel';
import { FootBar } from './foot-bar';
import { StepFields } from './step-fields';
import { VersionHead } from './version-head';
import { type VersionDeeds, VersionStore } from './version-store';

export interface GuideEditorProps {
  view: VersionView;
  mayEdit: boolean;
  deeds: VersionDeeds;
  startVersion: Action<StartVersion, { versionId: VersionId }>;
}

/** The words of the build guide: introduction, steps with the lines they use, and the cautions with their full words. */
export function GuideEditor(props: GuideEditorProps) {
  return (
    <ToastRegion>
      <Editor {...props} />
    </ToastRegion>
  );
}

function Editor({ view, mayEdit, deeds, startVersion }: GuideEditorProps) {
  const [store] = useState(() => new VersionStore(view, deeds));
  const snapshot = useSyncExternalStore(store.subscribe, store.read, store.read);
  const [isStarting, setStarting] = useState(false);
  const [startProblem, setStartProblem] = useState<string | null>(null);
  const router = useRouter();
  const { server, guide, content, save, conflict, lines } = snapshot;
  const canChange = mayEdit && server.state === 'draft';
  const lacks = versionFindings(content).find(({ code }) => code === 'GUIDE-MISS');

  async function start() {
    setStarting(true);
    const answer = await startVersion({ kitId: server.kitId, fromVersionId: server.id });
    if (answer.ok) router.push(`/bench/${answer.value.versionId}/guide`);
    else {
      setStarting(false);
      setStartProblem(answer.problem.sentence);
    }
  }

  return (
    <main id="main" className="flex min-h-dvh flex-col">
      <VersionHead view={server} page="guide" {...(mayEdit && { onStart: () => void start(), starting: isStarting })} />
      <div className="grid flex-1 content-start gap-x-8 gap-y-6 border-t border-rule bg-card px-4 py-5 sm:px-6 lg:grid-cols-[minmax(0,1fr)_26rem]">
        <div className="grid content-start gap-5">
          {startProblem !== null && (
            <Notice kind="stops" title="Not done" live="alert">
              {startProblem}
            </Notice>
          )}
          {conflict && <ConflictPanel conflict={conflict} onSettle={store.settle} />}
          {!canChange && (
            <Notice kind="info" title={`${content.kit.number} ${server.letter} keeps its guide`}>
              It was sent to check with these words. Start the next version to write it anew.
            </Notice>
          )}
          <div role="status" aria-live="polite">
            {lacks ? (
              <Notice kind="stops" title="The guide is not complete">
                {lacks.message}
              </Notice>
            ) : (
              <Notice kind="clears" title="The guide is complete">
                Every line is named in a step, and every caution stands.
              </Notice>
            )}
          </div>
          <Panel title="Introduction" ground="open">
            <TextArea
              label="Introduction"
              labelHidden
              hint="What the builder makes, how long it takes, and what it will do in the end."
              rows={4}
              maxLength={1200}
              readOnly={!canChange}
              value={guide.intro}
              onChange={(event) => store.changeGuide({ ...guide, intro: event.target.value })}
            />
          </Panel>
          <Steps
            guide={guide}
            references={lines.map(({ reference, part }) => ({ reference, name: part?.name ?? 'no part' }))}
            canChange={canChange}
            onChange={store.changeGuide}
          />
        </div>
        <Cautions guide={guide} canChange={canChange} onChange={store.changeGuide} />
      </div>
      <FootBar
        costMinor={lines.reduce((sum, line) => sum + line.costMinor, 0)}
        massMilligrams={contentMass(content)}
        pieces={lines.reduce((sum, line) => sum + (line.part?.unit === 'each' ? line.quantity : 1), 0)}
        save={canChange ? save : null}
        onRetry={() => void store.saveNow()}
      />
    </main>
  );
}

interface PartProps {
  guide: Guide;
  canChange: boolean;
  onChange: (guide: Guide) => void;
}

function Steps({
  guide,
  references,
  canChange,
  onChange,
}: PartProps & { references: readonly { reference: string; name: string }[] }) {
  const say = useToast();
  const { steps } = guide;
  const put = (next: GuideStep[]) => onChange({ ...guide, steps: next });

  function move(from: number, by: number) {
    const next = [...steps];
    const [step] = next.splice(from, 1);
    if (step) next.splice(from + by, 0, step);
    put(next);
  }

  function remove(index: number) {
    const before = steps;
    put(steps.filter((_, at) => at !== index));
    say({ sentence: `Step ${index + 1} is out of the guide.`, onUndo: () => put([...before]) });
  }

  return (
    <Panel title={steps.length === 1 ? 'One step' : `${steps.length} steps`} ground="open">
      <ol className="grid gap-6">
        {steps.map((step, index) => (
          <li key={index}>
            <StepFields
              number={index + 1}
              count={steps.length}
              step={step}
              references={references}
              canChange={canChange}
              onChange={(next) => put(steps.map((one, at) => (at === index ? next : one)))}
              onMove={(by) => move(index, by)}
              onRemove={() => remove(index)}
            />
          </li>
        ))}
      </ol>
      {canChange && (
        <div className="mt-5">
          <Button icon="plus" onClick={() => put([...steps, { title: '', text: '', uses: [], check: '' }])}>
            Add a step
          </Button>
        </div>
      )}
    </Panel>
  );
}

function Cautions({ guide, canChange, onChange }: PartProps) {
  const toggle = (code: CautionCode, isOn: boolean) =>
    onChange({
      ...guide,
      cautions: CautionCode.options.filter((one) => (one === code ? isOn : guide.cautions.includes(one))),
    });
  return (
    <Panel
      title="Cautions"
      note="All of them stand in every guide."
      ground="open"
      className="lg:sticky lg:top-4 lg:self-start"
    >
      <ul>
        {CautionCode.options.map((code) => (
          <li key={code} className="border-b border-rule last:border-0">
            <Checkbox
              label={cautions[code].title}
              hint={cautions[code].text}
              checked={guide.cautions.includes(code)}
              disabled={!canChange}
              onChange={(event) => toggle(code, event.target.checked)}
            />
          </li>
        ))}
      </ul>
      <p className="mt-3 text-caption text-ink2">{cautionNote}</p>
    </Panel>
  );
}
