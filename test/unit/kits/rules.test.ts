import { describe, expect, it } from 'vitest';
import {
  designOf,
  differences,
  fieldOf,
  latestLetter,
  letterAfter,
  mayBecome,
  partsOfBox,
  nearestPart,
  versionChange,
  versionFindings,
  wireNeeded,
} from '@/services/kits/rules';
import { VersionState } from '@/services/kits/schemas';
import { evaluate } from '@/services/receiver';
import { aVersion, someParts } from '../../builders/versions';

describe('version letters', () => {
  it('leave out I, O, Q, S, X and Z, and go on with AA after Y', () => {
    const letters = ['A'];
    while (letters.length < 42) letters.push(letterAfter(letters.at(-1) ?? null));
    expect(letters.slice(0, 21).join(' ')).toBe('A B C D E F G H J K L M N P R T U V W Y AA');
    expect(letters.slice(38).join(' ')).toBe('AW AY BA BB');
  });

  it('are found in their own order, not in the order of a dictionary', () => {
    expect(latestLetter(['B', 'AA', 'Y'])).toBe('AA');
    expect(latestLetter([])).toBeNull();
  });
});

describe('states of a version', () => {
  it('lead from held and withdrawn nowhere, and from released only to withdrawn', () => {
    const moves = VersionState.options.flatMap((from) =>
      VersionState.options.filter((to) => mayBecome(from, to)).map((to) => `${from} to ${to}`),
    );
    expect(moves).toEqual([
      'draft to in-check',
      'in-check to draft',
      'in-check to held',
      'in-check to released',
      'released to withdrawn',
    ]);
  });
});

describe('the design of a version', () => {
  it('takes each value with its tolerance from the part in its place', () => {
    const { design } = designOf(aVersion().plain());
    expect(design).toMatchObject({
      coil: { kind: 'solenoid', turns: 72, formerDiameter: 0.05, lFactor: { nominal: 1, tol: 0.02 } },
      tuning: { kind: 'capacitor', min: { nominal: 1.2e-11, tol: 0.05 } },
      coupling: { kind: 'series-c', c: { nominal: 1.2e-11 } },
      earphone: { kind: 'magnetic', rDc: 4000 },
    });
  });

  it('gives the reach of the worked reference for the same set', () => {
    const { design } = designOf(aVersion().plain());
    const { reach } = evaluate(design, { boxes: 0, seed: 1 });
    // solenoid-wire-aerial.json of the reference: 486.5 and 2004.4 kHz; its coil has q 150 and our Q follows from the wire.
    expect(reach.nominal.lo / 486_535).toBeCloseTo(1, 2);
    expect(reach.nominal.hi / 2_004_415).toBeCloseTo(1, 2);
  });

  it('says in a sentence each what is not chosen yet', () => {
    const { design, lacks } = designOf(aVersion().without('F1').without('E1').plain());
    expect(design).toBeNull();
    expect(lacks).toEqual(['Choose a coil former.', 'Choose an earphone.']);
  });

  it('asks for the tap that its coupling needs', () => {
    const { lacks } = designOf(aVersion().withCircuit({ coupling: 'aerial-tap' }).plain());
    expect(lacks).toEqual(['Say at which turn the aerial tap is.']);
  });
});

describe('findings of the version itself', () => {
  it('are none when guide, wire and aerial are as they should be', () => {
    expect(versionFindings(aVersion().plain())).toEqual([]);
  });

  it('count the ends and the taps into the wire of the coil', () => {
    const plain = aVersion().plain();
    const bare = 72 * Math.hypot(Math.PI * (0.05 + 0.000534), 0.00055);
    expect(wireNeeded(plain)).toBeCloseTo(bare + 0.3, 6);
    const tapped = { ...plain, circuit: { ...plain.circuit, winding: { ...plain.circuit.winding, aerialTap: 12 } } };
    expect(wireNeeded(tapped)).toBeCloseTo(bare + 0.3 + 0.08, 6);
  });

  it('propose a cut that is long enough, and applying it clears the finding', () => {
    const short = aVersion().withQuantity('L1', 9_000).plain();
    const [finding] = versionFindings(short);
    expect(finding).toMatchObject({ code: 'WIRE-SHORT', severity: 'stop' });
    const changed = versionChange(short, finding?.remedy?.changes ?? []);
    const mended = short.lines.map((line) => ({
      ...line,
      quantity: changed?.quantities.get(line.reference) ?? line.quantity,
    }));
    expect(versionFindings({ ...short, lines: mended })).toEqual([]);
  });

  it('note an aerial that is shorter than the design assumes', () => {
    const { circuit } = aVersion().plain();
    const long = aVersion()
      .withCircuit({ aerial: { ...circuit.aerial, horizontal: 60 } })
      .plain();
    expect(versionFindings(long).map(({ code, severity }) => `${code} ${severity}`)).toEqual(['AERIAL-SHORT note']);
  });

  it('name each caution that is left out by its title', () => {
    const { guide } = aVersion().plain();
    const without = aVersion()
      .withGuide({ ...guide, cautions: guide.cautions.filter((code) => code !== 'thunder') })
      .plain();
    expect(versionFindings(without)[0]?.message).toBe('The guide lacks the caution "Thunder".');
  });
});

describe('what differs between two versions', () => {
  it('is nothing when only the order of the lines differs', () => {
    const plain = aVersion().plain();
    expect(differences(plain, { ...plain, lines: [...plain.lines].reverse() })).toEqual([]);
  });

  it('is told by reference, with what was there before and now', () => {
    const before = aVersion().plain();
    const after = aVersion().withPart('E1', 'E-32').without('G1').withTurns(75).plain();
    expect(differences(before, after).map(({ what, from, to }) => `${what}: ${from} > ${to}`)).toEqual([
      'line E1: Headset, high impedance, 1 > Earphone, 32 ohm, 1',
      'line G1: Earth lead, 5 m, 1 > null',
      'turns: 72 > 75',
      'steps of the guide: 8 > 7',
    ]);
  });

  it('includes a part whose values changed though its name did not', () => {
    const before = aVersion().plain();
    const lines = before.lines.map((line) =>
      line.part?.values.kind === 'earth-lead'
        ? { ...line, part: { ...line.part, values: { ...line.part.values, length: 9 } } }
        : line,
    );
    expect(differences(before, { ...before, lines })).toEqual([
      { what: 'values of G1', from: 'as they were', to: 'as the part has them now' },
    ]);
  });
});

describe('where a finding points', () => {
  it.each([
    ['coil.turns', { kind: 'circuit', setting: 'turns' }],
    ['coil.taps.detector', { kind: 'circuit', setting: 'detectorTap' }],
    ['coil', { kind: 'place', place: 'tuning coil' }],
    ['tuning.max', { kind: 'place', place: 'tuning capacitor' }],
    ['returnResistor', { kind: 'place', place: 'return resistor' }],
    ['lines.L1.quantity', { kind: 'line', reference: 'L1' }],
    ['guide', { kind: 'guide' }],
    ['temperature', { kind: 'whole' }],
  ])('%s', (path, field) => {
    expect(fieldOf(path)).toEqual(field);
  });

  it('a remedy that asks for closer tolerances is left to a person', () => {
    const plain = aVersion().plain();
    expect(versionChange(plain, [{ path: 'tuning.max.tol', from: 0.05, to: 0.02 }])).toBeNull();
    expect(versionChange(plain, [{ path: 'coil.turns', from: 72, to: 74 }])?.circuit.winding.turns).toBe(74);
  });

  it('a remedy that asks for another capacitor finds the nearest one that is kept, or none', () => {
    const plain = aVersion().plain();
    const [wanted] = versionChange(plain, [{ path: 'coupling.c.nominal', from: 2.2e-11, to: 1.25e-11 }])?.wanted ?? [];
    expect(wanted).toEqual({ place: 'coupling capacitor', value: 1.25e-11 });
    if (!wanted) throw new Error('nothing wanted');
    expect(nearestPart(wanted, someParts)?.code).toBe('CC-12');
    expect(nearestPart({ ...wanted, value: 3.3e-11 }, someParts)).toBeNull();
  });
});

describe('what a box needs from the store', () => {
  it('sums a part over its lines and leaves out what is printed', () => {
    const plain = aVersion().plain();
    const [first] = plain.lines.filter((line) => line.reference === 'C2');
    if (!first) throw new Error('no line');
    const needs = partsOfBox({ lines: [...plain.lines, { ...first, reference: 'C9', quantity: 2 }] });
    expect(needs.get('CC-12')).toBe(3);
    expect(needs.get('W-500')).toBe(13_500);
    expect(needs.has('P-7')).toBe(false);
  });
});
