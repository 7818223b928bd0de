import { Panel } from '@/components/ui/panel';
import { Sign } from '@/components/ui/sign';
import { Disclosure } from '@/components/ui/disclosure';
import type { KitPage } from '@/services/catalogue/schemas';
import { grouped } from '@/services/quantity';
import { showDate } from '@/services/time';
import { shownEdge } from '@/templates/drawings/reach-axis';
import { kHz } from './words';

/** How this version was checked: the edges, the tried boxes, the notes with their reasons, and who signed. */
export function CheckPanel({ kit }: { kit: KitPage }) {
  const { check, reach } = kit;
  if (!check || !reach) return null;
  const rows = [
    { edge: `Low end, ${shownEdge(reach.band.lo)} asked`, worst: kHz(reach.worst.lo), nominal: kHz(reach.nominal.lo) },
    { edge: `High end, ${shownEdge(reach.band.hi)} asked`, worst: kHz(reach.worst.hi), nominal: kHz(reach.nominal.hi) },
  ];
  const notes = check.findings.filter((finding) => finding.severity === 'note');
  return (
    <Panel title={`How ${kit.number}\u202f${kit.letter} was checked`} level={2}>
      <table className="w-full border-collapse text-table">
        <caption className="sr-only">Reach against the band, in kilohertz</caption>
        <thead>
          <tr className="border-b-1.5 border-ink text-head text-ink2">
            <th scope="col" className="py-1.5 text-left font-semibold">
              Edge
            </th>
            <th scope="col" className="py-1.5 text-right font-semibold">
              Nominal, kHz
            </th>
            <th scope="col" className="py-1.5 pl-3 text-right font-semibold">
              Worst, kHz
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.edge} className="border-b border-rule">
              <th scope="row" className="py-2 text-left font-normal">
                {row.edge}
              </th>
              <td className="py-2 text-right font-figures">{row.nominal}</td>
              <td className="py-2 text-right font-figures font-semibold">{row.worst}</td>
            </tr>
          ))}
          {check.share && (
            <tr className="border-b border-rule">
              <th scope="row" className="py-2 text-left font-normal">
                Tried boxes reaching both
              </th>
              <td colSpan={2} className="py-2 text-right font-figures font-semibold">
                {grouped(check.share.covered)} of {grouped(check.share.boxes)}
              </td>
            </tr>
          )}
        </tbody>
      </table>
      {notes.length > 0 && (
        <ul className="mt-3 grid gap-2 text-caption">
          {notes.map((note) => (
            <li key={note.message} className="flex gap-2">
              <Sign kind="note" size={16} className="mt-0.5" />
              <span>
                {note.message}
                {note.reason && <span className="block text-ink2">The checker: {note.reason}</span>}
              </span>
            </li>
          ))}
        </ul>
      )}
      <p className="mt-3 font-signature text-[24px] leading-[30px] text-enamel">{check.by}</p>
      <p className="text-caption text-ink2">Checker, {showDate(check.at)}. Nobody signs what they drew.</p>
      <Disclosure summary="Show how to repeat it" of="the check" className="mt-2">
        <dl className="grid grid-cols-[auto_1fr] gap-x-4 gap-y-1 text-caption">
          <dt className="text-ink2">Content</dt>
          <dd className="min-w-0 font-figures break-all">{check.contentHash}</dd>
          <dt className="text-ink2">Engine</dt>
          <dd className="font-figures">{check.engineVersion}</dd>
          <dt className="text-ink2">Rules</dt>
          <dd className="font-figures">{check.rulesVersion}</dd>
        </dl>
      </Disclosure>
    </Panel>
  );
}
