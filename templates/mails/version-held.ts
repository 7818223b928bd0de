import { type Letter, letter } from './letter';
import { type VersionMailView, remarkOf } from './version-view';

export const versionHeld = (view: VersionMailView): Letter =>
  letter(`${view.kitName} ${view.letter} is held`, view.name, [
    { line: `Version ${view.letter} of ${view.kitName} is held and comes back to the bench.` },
    ...remarkOf(view),
    { link: view.link, label: 'See the findings' },
    { line: 'Mend it in a new version, which starts from this one, and send that to check.' },
  ]);
