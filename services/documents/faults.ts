import { valuesAt } from '../kits/rules';
import type { VersionContent } from '../kits/schemas';
import type { GuideView } from './schemas';

/** What to look at, in the order in which it is most often the cause; each step can be done without tools first. */
export function faultsOf(content: VersionContent): GuideView['faults'] {
  const earphone = valuesAt(content, 'earphone', 'earphone');
  const detector = valuesAt(content, 'detector', 'detector');
  const resistor = content.lines.find((line) => line.place === 'return resistor');
  const isCrystal = earphone?.earphoneKind === 'ceramic';
  const isContact = detector?.detectorClass === 'mineral' || detector?.detectorClass === 'oxide-contact';
  const along = content.circuit.aerial.vertical + content.circuit.aerial.horizontal;
  return [
    {
      sign: 'No sound at all, not even a click',
      cure: isCrystal
        ? `Touch the earphone leads to the terminals: a soft click says that it lives. Use the earphone of the box only${resistor ? `, with ${resistor.reference} across it` : ''}; a music earphone stays silent here.`
        : 'Touch the earphone leads to the terminals: a click says that it lives. Use the earphone of the box only; a music earphone of a few ohms stays silent here.',
    },
    {
      sign: 'A click, but no station',
      cure: isContact
        ? 'Set the point on the detector down in another place, lightly, until you hear something. Most places do nothing.'
        : 'Look at the detector: joints bright, leads not bent at the glass. Try the spare, or turn it round.',
    },
    {
      sign: 'The meter reads nothing through the coil',
      cure: 'Enamel is left on an end, or the wire is broken. Scrape the last 2 cm of each end bright and measure again.',
    },
    {
      sign: 'Sound only with a finger on a terminal',
      cure: `The aerial or the earth is missing. This set counts on ${along} m of wire and a real earth. Follow both leads with your hand, end to end.`,
    },
    {
      sign: 'The same station over the whole dial',
      cure: 'The capacitor is not in the circuit, or its plates touch. Turn it slowly with a meter across it: it must never show a connection.',
    },
    {
      sign: 'All stations too low or too high on the dial',
      cure: 'Count the turns again. One turn too few moves every station toward the closed end of the capacitor.',
    },
    {
      sign: 'Weak everywhere',
      cure: 'Listen after dark, when far stations carry. A longer and higher aerial helps most, a better earth next. Tuning says nothing of strength.',
    },
  ];
}
