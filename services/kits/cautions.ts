import type { CautionCode } from './schemas';

/**
 * The words of each caution (content of receiver.md I; meaning fixed, wording ours). General advice: local codes and
 * licensed practice rule, and every place that shows them says so.
 */
export const cautions: Record<CautionCode, { title: string; text: string }> = {
  'outdoor-aerial': {
    title: 'Outdoor aerial',
    text: 'Put an aerial outdoors only as your local electrical code allows. Where the code asks for a discharge unit and an earth conductor, fit them; where it asks for a licensed electrician, have one do it.',
  },
  thunder: {
    title: 'Thunder',
    text: 'Before a storm, disconnect the aerial and earth it outside. Do not touch it or listen during one. An arrestor does not protect against a direct strike.',
  },
  'power-lines': {
    title: 'Power lines',
    text: 'Never put a wire above, under or near overhead power lines, nor where it could fall on one. Contact is usually fatal. Adults put aerials up.',
  },
  earth: {
    title: 'Earth',
    text: 'Never use a mains socket, mains earth, gas pipe, heating pipe or an unknown pipe as earth. Use the earth lead of the kit on a rod, or an earth that a competent person approves. Look for buried services before driving a rod.',
  },
  'no-mains': {
    title: 'No mains, no amplifier',
    text: 'Never connect the set or its earphone to the mains, a charger or an amplifier. Nothing in this kit needs a battery.',
  },
  hearing: {
    title: 'Hearing',
    text: 'Near a strong station the sound can be sudden. Start with the earphone off the ear.',
  },
  'small-parts': {
    title: 'Small parts and sharp ends',
    text: 'Not for children under 36 months: small parts, sharp wire ends and edges. Blades are for adults. The age mark follows local toy law.',
  },
  'hot-tools': {
    title: 'Solder and hot tools',
    text: 'Solder with adult help and good air, with lead-free solder, and wash your hands. Do not grind or lick crystals or minerals.',
  },
  'wire-across-path': {
    title: 'A wire across a path',
    text: 'A wire across a path trips and can strangle. Hang it above head height, mark it, and take it down after use.',
  },
};

export const cautionNote = 'These are general cautions. Local codes and licensed practice rule.';
