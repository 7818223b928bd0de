import { GuideCircuit, GuideWinding } from './guide-coil';
import { GuideCautions, GuideCover } from './guide-cover';
import { GuideEnd } from './guide-end';
import { GuideParts } from './guide-parts';
import type { GuideProps } from './guide-props';
import { GuideSteps } from './guide-steps';
import { Papers } from './sheet';

/** The build guide of one box: cover, cautions, parts, coil, circuit, one step a page, tuning and faults. */
export function GuidePaper({ view, size }: GuideProps) {
  const { plate } = view;
  return (
    <Papers
      title={`Build guide, ${plate.name}, version ${plate.number} ${plate.letter}`}
      subject={`Box ${view.serial}, content ${view.hash}`}
      author={view.seller}
    >
      <GuideCover view={view} size={size} />
      <GuideCautions view={view} size={size} />
      <GuideParts view={view} size={size} />
      <GuideWinding view={view} size={size} />
      <GuideCircuit view={view} size={size} />
      <GuideSteps view={view} size={size} />
      <GuideEnd view={view} size={size} />
    </Papers>
  );
}
