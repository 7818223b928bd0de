'use client'; // Drawn whole: parts of a server-drawn picture that stream in later come in an inline style, which the CSP drops.

import type { ReactNode } from 'react';
import { ReachRail } from '@/components/charts/reach-rail';
import { Plate } from '@/components/devices/plate';
import { Notice } from '@/components/ui/notice';
import { Table } from '@/components/ui/table';
import type { GuidePart, GuideView } from '@/services/documents/schemas';
import { SvgDrawing } from '@/templates/drawings/as-svg';
import { circuitDrawing, circuitSentence } from '@/templates/drawings/circuit-drawing';
import { windingDrawing } from '@/templates/drawings/winding-drawing';
import { GuideStep } from './guide-step';
import { PartPicture } from './part-picture';

/** The build guide as a page: what the PDF says, in the same order, for screens, readers and large print. */
export function GuidePage({ guide, pdf }: { guide: GuideView; pdf: string }) {
  const { plate } = guide;
  return (
    <main id="main" className="mx-auto grid max-w-page grid-cols-[minmax(0,1fr)] gap-12 px-4 py-8 sm:px-8">
      <header className="grid gap-3">
        <div className="flex flex-wrap items-center gap-4">
          <Plate kit={plate.number} version={plate.letter} />
          <span className="font-figures">box {guide.serial}</span>
          <span className="font-figures">content {guide.hash}</span>
          <a href={pdf} className="link ml-auto font-bold">
            The same as PDF, to print
          </a>
        </div>
        <h1 className="font-display text-page">Build guide: {plate.name}</h1>
        <p className="max-w-measure text-lead">{guide.summary}</p>
        <p className="text-ink2">
          {guide.audience}, from {guide.ageFrom} years.
          {guide.released && ` Checked by ${guide.released.by}, released ${guide.released.on}.`} Made for version{' '}
          {plate.number} {plate.letter} only.
        </p>
        {guide.withdrawn !== '' && (
          <Notice kind="stops" title="Take note">
            {guide.withdrawn}
          </Notice>
        )}
        <ReachRail size="bench" {...guide.reach} />
      </header>

      <Part title="Cautions first">
        <p className="mb-3 font-bold">{guide.cautionNote}</p>
        <dl className="grid gap-3">
          {guide.cautions.map((caution) => (
            <div key={caution.title} className="grid gap-x-6 border-t border-rule pt-3 sm:grid-cols-[12rem_1fr]">
              <dt className="font-bold">{caution.title}</dt>
              <dd className="max-w-measure">{caution.text}</dd>
            </div>
          ))}
        </dl>
      </Part>

      <Part title="Before you begin">
        <p className="max-w-measure">{guide.intro}</p>
        <ul className="mt-2 list-disc pl-6">
          {guide.needs.map((need) => (
            <li key={need}>{need}</li>
          ))}
        </ul>
      </Part>

      <Part title="What is in the box">
        <Table<GuidePart>
          caption={`${guide.pieces} pieces and this guide`}
          captionShown
          rows={guide.parts}
          rowKey={(part) => part.reference}
          columns={[
            {
              key: 'picture',
              head: 'Picture',
              headHidden: true,
              cell: (part) => <PartPicture family={part.family} width={56} />,
            },
            { key: 'line', head: 'Line', figures: true, align: 'left', cell: (part) => part.reference },
            { key: 'name', head: 'Part', isRowHead: true, cell: (part) => part.name },
            {
              key: 'recognise',
              head: 'How to recognise it',
              cell: (part) => [part.marking, part.note].filter((text) => text !== '').join('; '),
            },
            { key: 'amount', head: 'Pieces', figures: true, cell: (part) => part.amount },
          ]}
        />
        <h3 className="mt-6 mb-1 font-display text-panel">Tools</h3>
        <ul className="list-disc pl-6">
          {guide.tools.map((tool) => (
            <li key={tool}>{tool}</li>
          ))}
        </ul>
      </Part>

      <Part title="The coil">
        <SvgDrawing drawing={windingDrawing(guide.winding)} className="max-w-2xl" />
        <Table
          caption="The winding in figures"
          rows={guide.windingRows}
          rowKey={(row) => row.what}
          columns={[
            { key: 'what', head: 'What', isRowHead: true, cell: (row) => row.what },
            { key: 'value', head: 'Figure', cell: (row) => <span className="font-figures">{row.value}</span> },
          ]}
          className="max-w-2xl"
        />
        <h3 className="mt-6 mb-1 font-display text-panel">Where to stop on the way</h3>
        <Table
          caption="Start, taps and end of the winding"
          rows={guide.tapRows}
          rowKey={(row) => row.point}
          columns={[
            { key: 'point', head: 'Point', isRowHead: true, cell: (row) => row.point },
            { key: 'turns', head: 'Turns from the start', figures: true, cell: (row) => row.turns },
            { key: 'wire', head: 'Wire from the start', figures: true, cell: (row) => row.wire },
            { key: 'to', head: 'Goes to', cell: (row) => row.goesTo },
          ]}
          className="max-w-2xl"
        />
      </Part>

      <Part title="The circuit">
        <SvgDrawing drawing={circuitDrawing(guide.circuit)} className="max-w-3xl" />
        <p className="mt-3 max-w-measure">{circuitSentence(guide.circuit)}</p>
      </Part>

      <Part title="Step by step">
        <ol className="grid gap-10">
          {guide.steps.map((step) => (
            <GuideStep key={step.number} step={step} of={guide.steps.length} guide={guide} />
          ))}
        </ol>
      </Part>

      <Part title="What you should tune">
        <Table
          caption="Ends of the dial"
          rows={guide.tune}
          rowKey={(row) => row.end}
          columns={[
            { key: 'end', head: 'Capacitor', isRowHead: true, cell: (row) => row.end },
            { key: 'nominal', head: 'Nominal', figures: true, cell: (row) => row.nominal },
            { key: 'worst', head: 'Every box, at worst case', figures: true, cell: (row) => row.worst },
            { key: 'hint', head: 'Which end', cell: (row) => row.hint },
          ]}
          className="max-w-3xl"
        />
      </Part>

      <Part title="If it stays silent">
        <dl className="grid gap-3">
          {guide.faults.map((fault) => (
            <div key={fault.sign} className="grid gap-x-6 border-t border-rule pt-3 sm:grid-cols-[16rem_1fr]">
              <dt className="font-bold">{fault.sign}</dt>
              <dd className="max-w-measure">{fault.cure}</dd>
            </div>
          ))}
        </dl>
      </Part>

      <Part title="A part is missing or broken">
        <p className="max-w-measure">{guide.missing}</p>
      </Part>
    </main>
  );
}

function Part({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section className="border-t-2 border-ink pt-4">
      <h2 className="mb-3 font-display text-section">{title}</h2>
      {children}
    </section>
  );
}
