import { ReachRail } from '@/components/charts/reach-rail';
import { ReachTable } from '@/components/charts/reach-table';
import { ResponseCurve } from '@/components/charts/response-curve';
import { Notice } from '@/components/ui/notice';
import { VisuallyHidden } from '@/components/ui/visually-hidden';
import { fieldOf } from '@/services/kits/rules';
import type { VersionContent } from '@/services/kits/schemas';
import { grouped } from '@/services/quantity';
import { DownloadDesign } from './download-design';
import { FindingList } from './finding-list';
import { LimitList } from './limit-list';
import { RemedyCards } from './remedy-cards';
import { VerdictHead } from './verdict-head';
import type { LiveVerdict, TriedRemedy, VerdictAnswer } from './verdict-messages';
import { shareWords } from './verdict-words';

export interface VerdictPaneProps {
  content: VersionContent;
  answer: VerdictAnswer | null;
  /** Boxes being tried; 0 when done. */
  trying: number;
  /** Applies a remedy; absent where the version cannot be changed. */
  onTry?: ((remedy: TriedRemedy) => void) | undefined;
}

/** The live verdict: sentence, share, rail, response, ways to mend it, and every finding. */
export function VerdictPane({ content, answer, trying, onTry }: VerdictPaneProps) {
  const { band } = content.kit;
  const stations = content.circuit.place.stations;
  const empty = { band, nominal: null, worst: null, stations };
  if (!answer) {
    return (
      <div aria-busy>
        <p className="mb-4 text-caption text-ink2">Working out the reach</p>
        <ReachRail {...empty} size="bench" />
      </div>
    );
  }
  if (answer.kind === 'lacks') {
    return (
      <div className="grid gap-5">
        <Notice kind="info" title="The verdict waits for parts" level={2}>
          <ul className="list-disc pl-5">
            {answer.lacks.map((lack) => (
              <li key={lack}>{lack}</li>
            ))}
          </ul>
        </Notice>
        <ReachRail {...empty} size="bench" />
      </div>
    );
  }
  if (answer.kind === 'invalid') {
    return (
      <Notice kind="stops" title="This set cannot be worked out" level={2} live="status">
        <ul className="list-disc pl-5">
          {answer.issues.map(({ path, message }) => (
            <li key={path + message}>{`${fieldWords(path)}: ${message}`}</li>
          ))}
        </ul>
      </Notice>
    );
  }
  return <Worked content={content} live={answer.live} trying={trying} onTry={onTry} />;
}

function Worked({
  content,
  live,
  trying,
  onTry,
}: Pick<VerdictPaneProps, 'content' | 'trying' | 'onTry'> & { live: LiveVerdict }) {
  const { verdict, findings, contour, settings, remedies } = live;
  const { band } = content.kit;
  const { stations } = content.circuit.place;
  const view = { band, nominal: verdict.reach.nominal, worst: verdict.reach.corners, contour, stations };
  const share = shareWords(verdict.share);
  return (
    <div className="grid gap-5">
      <VerdictHead verdict={verdict} findings={findings} band={band} share={share} />
      <VisuallyHidden>
        <p role="status" aria-live="polite">
          {trying === 0 && share ? `${share.figure} ${share.text}.` : ''}
        </p>
      </VisuallyHidden>
      <div>
        <ReachRail {...view} size="bench" />
        <div className="mt-1 flex flex-wrap items-baseline justify-between gap-x-6 gap-y-1">
          <ReachTable {...view} />
          <p className="text-caption text-ink2">
            {trying === 0
              ? `Worked out with ${grouped(verdict.boxes)} boxes.`
              : `Working out the share, ${grouped(verdict.boxes)} of ${grouped(20_000)} boxes tried.`}
          </p>
        </div>
      </div>
      <section aria-labelledby="response-title">
        <h3 id="response-title" className="mb-1 font-bold">
          Response at three dial settings{' '}
          <span className="font-normal text-caption text-ink2">relative to the strongest</span>
        </h3>
        <ResponseCurve
          band={band}
          settings={settings}
          chosen={settings[1]?.f}
          stations={stations}
          model={modelWords(live)}
        />
      </section>
      {remedies !== null && remedies.length > 0 && <RemedyCards band={band} remedies={remedies} onTry={onTry} />}
      <FindingList findings={findings} />
      <LimitList limits={verdict.limits} />
      <p>
        <DownloadDesign content={content} />
      </p>
    </div>
  );
}

function modelWords({ verdict }: LiveVerdict): string {
  const middle = verdict.points[1];
  const q = verdict.coil.q === null ? null : `coil quality ${Math.round(verdict.coil.q)}`;
  const load = middle?.inputR == null ? null : `detector load ${Math.round(middle.inputR / 1000)} kΩ`;
  const words = [q, load].filter((one) => one !== null);
  return words.length === 0 ? '' : `Worked out with ${words.join(' and ')} in the middle of the band.`;
}

function fieldWords(path: string): string {
  const field = fieldOf(path);
  if (field.kind === 'place') return `The ${field.place}`;
  if (field.kind === 'circuit') return `The ${settingWords[field.setting] ?? field.setting}`;
  return field.kind === 'line' ? `Line ${field.reference}` : path;
}
const settingWords: Record<string, string> = {
  aerialTap: 'aerial tap',
  detectorTap: 'detector tap',
  tolerance: 'winding tolerance',
  vertical: 'riser of the aerial',
  horizontal: 'level part of the aerial',
  siteFactor: 'site factor',
  detectorAt: 'place of the detector',
};
