import { type Letter, letter } from './letter';
import { type VersionMailView, remarkOf } from './version-view';

export const versionReleased = (view: VersionMailView): Letter =>
  letter(`${view.kitName} ${view.letter} is released`, view.name, [
    { line: `Version ${view.letter} of ${view.kitName} is released and can be sold.` },
    ...remarkOf(view),
    { link: view.link, label: 'See the version' },
  ]);
