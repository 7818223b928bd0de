import { CautionCode, type Guide } from '@/services/kits/schemas';
import type { DemoSet } from './kits';

/** The build guide of a demo set: its steps name the lines they use; the papers add tables and drawings from the version. */
export function guideOf(name: string, set: DemoSet): Guide {
  const hasResistor = set.returnResistor !== undefined;
  return {
    intro: `${name} runs on the signal itself: no battery, nothing to charge. You wind one coil, fit nine parts and hang a wire. Read each step to its end before you begin it.`,
    steps: [
      {
        title: 'Lay out the parts',
        text: 'Empty the box on a light cloth and tick each part on the list. Lay the small bag aside unopened until you need it. If a part is missing, stop here and write to us with the serial of the box.',
        uses: ['B1', 'X1', 'K1', 'X2', 'X3'],
        check: 'Every line of the list has its tick.',
      },
      {
        title: 'Wind the coil',
        text: `Thread the wire through the two holes at one rim, leave 15 cm and tape it down. Wind ${set.turns} turns, all the same way, side by side. Mark every tenth turn with a pencil. Thread the end through the far holes and leave 15 cm. Scrape the last 2 cm of both ends bright.`,
        uses: ['L1', 'W1'],
        check:
          'With a meter, start to end reads the resistance of the winding table, within a tenth. No reading means a break, or enamel left on an end.',
      },
      {
        title: 'Fit the board',
        text: 'Screw the four terminals into the drilled holes: aerial and earth at the left, earphone at the right. Screw the capacitor to its place and set the knob on its shaft so that it points to the left when the vanes are fully in.',
        uses: ['B1', 'X1', 'X2', 'C1', 'K1'],
        check: 'The knob turns freely from stop to stop.',
      },
      {
        title: 'Join aerial, coil and earth',
        text: `Fix the coil to the board, start of the winding toward the earth terminal. Join the start to earth and the end to the capacitor.${set.coupling === 'series-c' ? ' The small ceramic capacitor goes between the aerial terminal and the end of the coil.' : ' The tap goes to the aerial terminal.'}`,
        uses: ['L1', set.couplingCapacitor === undefined ? 'C1' : 'C2', 'X1'],
        check:
          'No reading between the aerial and earth terminals through the small capacitor; a reading of the coil between its two ends.',
      },
      {
        title: 'Fit the detector',
        text: `Bend its leads with your fingers, not at the glass. Band toward the earphone terminal. It joins the ${set.detectorTap === undefined ? 'end of the coil' : 'tap'} to the earphone.${hasResistor ? ' The resistor goes across the earphone terminals: it gives the detector its way back.' : ''}`,
        uses: ['D1', ...(hasResistor ? ['R1'] : []), 'E1'],
        check: 'Touch the earphone leads to the terminals: a faint click.',
      },
      {
        title: 'Hang the aerial, lay the earth',
        text: `Read the cautions again. Hang ${set.vertical + set.horizontal} m of wire as high and clear as you can, ${set.vertical} m of it rising from the set. Clip the earth lead to the rod or to an earth that a competent person approves.`,
        uses: ['A1', 'G1'],
        check: 'The wire hangs clear of power lines, gutters and paths.',
      },
      {
        title: 'Listen',
        text: 'Earphone first off the ear. Turn the knob slowly through its whole way, in the evening as well as by day. Mark what you find on the blank dial.',
        uses: ['E1', 'K1', 'A1', 'G1'],
        check: 'The strongest station of your region comes and goes as the knob turns.',
      },
    ],
    cautions: [...CautionCode.options],
  };
}
