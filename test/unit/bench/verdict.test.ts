import { describe, expect, it } from 'vitest';
import { answerTo } from '@/components/bench/verdict-handler';
import type { LiveVerdict } from '@/components/bench/verdict-messages';
import { headlineOf, shareWords } from '@/components/bench/verdict-words';
import { evaluateContent } from '@/services/kits/evaluation';
import { stopsIn, withChange } from '@/services/kits/rules';
import type { VersionContent } from '@/services/kits/schemas';
import { canonicalJson } from '@/services/record';
import { aVersion } from '../../builders/versions';

const live = (content: VersionContent, boxes = 0): LiveVerdict => {
  const answer = answerTo({ number: 1, content, boxes });
  if (answer.kind !== 'verdict') throw new Error(`No verdict: ${JSON.stringify(answer)}`);
  return answer.live;
};
const headline = (content: VersionContent) => {
  const { verdict, findings } = live(content);
  return headlineOf(verdict, findings, content.kit.band);
};

describe('the live verdict', () => {
  it('is to the last digit what the server works out from the same content', () => {
    for (const turns of [40, 72, 95]) {
      const content = aVersion().withTurns(turns).plain();
      const server = evaluateContent(content, { boxes: 2000, seed: 1 });
      const browser = live(content, 2000);
      expect(canonicalJson(browser.verdict)).toBe(canonicalJson(server.verdict));
      expect(canonicalJson(browser.findings)).toBe(canonicalJson(server.findings));
    }
  });

  it('carries the number of its request, so that an older answer can be told', () => {
    expect(answerTo({ number: 17, content: aVersion().plain(), boxes: 0 }).number).toBe(17);
  });

  it('says what is lacking instead of a verdict', () => {
    const answer = answerTo({ number: 1, content: aVersion().without('C1').plain(), boxes: 0 });
    expect(answer).toMatchObject({ kind: 'lacks', lacks: ['Choose a tuning capacitor.'] });
  });

  it('names the value that cannot be, and breaks on none', () => {
    const { circuit } = aVersion().plain();
    const content = aVersion()
      .withCircuit({ winding: { ...circuit.winding, pitch: 0.0001 } })
      .plain();
    const answer = answerTo({ number: 1, content, boxes: 0 });
    if (answer.kind !== 'invalid') throw new Error('A pitch under the wire is no pitch.');
    expect(answer.issues.map(({ path }) => path)).toEqual(['coil.pitch']);
  });

  it('offers remedies that mend what they are for', () => {
    const content = aVersion().withTurns(62).plain();
    const remedy = live(content, 1000).remedies?.find(({ code }) => code === 'BAND-LOW');
    if (!remedy) throw new Error('62 turns are short at the low end, and more turns mend it.');
    const mended = live(withChange(content, remedy.change), 1000);
    expect(mended.findings.map(({ code }) => code)).not.toContain('BAND-LOW');
    expect(remedy.stops).toEqual(stopsIn(mended.verdict.findings).map(({ message }) => message));
  });

  it('does not call a remedy clear while the other end is short', () => {
    const content = aVersion().withPart('C1', 'C-220').plain();
    const codes = stopsIn(live(content).findings).map(({ code }) => code);
    const remedies = live(content, 1000).remedies ?? [];
    expect(codes).toContain('BAND-LOW');
    for (const { change, stops } of remedies) {
      if (stops.length === 0) expect(stopsIn(live(withChange(content, change)).verdict.findings)).toEqual([]);
    }
  });
});

describe('the verdict in words', () => {
  it('leads with the end that is short, and by how much', () => {
    const { title, text, sign } = headline(aVersion().withTurns(40).plain());
    expect(title).toBe('Short at the low end');
    expect(sign).toBe('stops');
    expect(text).toMatch(
      /^At worst case this version stops at \d+ kHz\. The band asks for 526\.5, so \d+ kHz is out of reach\.$/,
    );
  });

  it('says both ends when both are short', () => {
    expect(headline(aVersion().withPart('C1', 'C-220').withTurns(84).plain()).title).toMatch(/^Short at/);
  });

  it('names the earphone when that alone stops it', () => {
    expect(headline(aVersion().withPart('E1', 'E-32').plain()).title).toBe('The earphone does not suit');
  });

  it('counts the notes of a version that clears', () => {
    expect(headline(aVersion().plain()).title).toMatch(/^Clears/);
  });

  it('writes the count where all boxes reach, never a hundred per cent', () => {
    expect(shareWords({ covered: 20_000, boxes: 20_000, low: 0.9998, high: 1 })?.figure).toBe('20\u202f000');
    expect(shareWords({ covered: 19_999, boxes: 20_000, low: 0.9997, high: 1 })?.figure).toBe('99.9\u202f%');
    expect(shareWords({ covered: 10_320, boxes: 20_000, low: 0.5, high: 0.53 })?.figure).toBe('51.6\u202f%');
  });
});
