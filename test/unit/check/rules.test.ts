import { describe, expect, it } from 'vitest';
import { clearedRules } from '@/services/check/cleared';
import { releaseBlockers } from '@/services/check/rules';
import { type Finding, allFindings, designOf, findingKey } from '@/services/kits/rules';
import { evaluate } from '@/services/receiver';
import { aVersion } from '../../builders/versions';

const finding = (code: string, severity: Finding['severity'], path = 'coil'): Finding => ({
  code,
  severity,
  path,
  value: null,
  limit: null,
  unit: '',
  message: `${code} speaks.`,
  remedy: null,
});
const judged = (findings: Finding[], reasons: Record<string, string> = {}) =>
  releaseBlockers({ state: 'in-check', contentHash: 'a', readHash: 'a', findings, reasons });

describe('what keeps a version from being released', () => {
  it('is nothing when no stop stands and every note has its reason', () => {
    const note = finding('Q-LOW', 'note');
    expect(judged([note, finding('SEL-ADJ', 'info')], { [findingKey(note)]: 'Right for a first set.' })).toEqual([]);
  });

  it('is each stop, in words', () => {
    expect(judged([finding('BAND-LOW', 'stop')])).toEqual(['One finding stops it: BAND-LOW speaks.']);
    expect(judged([finding('BAND-LOW', 'stop'), finding('PHONE-Z', 'stop')])).toEqual([
      '2 findings stop it: BAND-LOW speaks. PHONE-Z speaks.',
    ]);
  });

  it('is a reason that says nothing', () => {
    const note = finding('Q-LOW', 'note');
    for (const reason of ['', '   ', 'ok', '          x']) {
      expect(judged([note], { [findingKey(note)]: reason })).toEqual(['One note has no reason yet.']);
    }
  });

  it('is not mended by a reason for another place of the same code', () => {
    const [one, other] = [finding('DATA-NONE', 'note', 'tuning.max'), finding('DATA-NONE', 'note', 'stray')];
    expect(judged([one, other], { [findingKey(one)]: 'Measured next week.' })).toEqual(['One note has no reason yet.']);
  });

  it('is a hash that is not the one that was read, and a state that does not wait', () => {
    const base = { findings: [], reasons: {}, contentHash: 'a' };
    expect(releaseBlockers({ ...base, state: 'in-check', readHash: 'b' })).toHaveLength(1);
    for (const state of ['draft', 'held', 'released', 'withdrawn'] as const) {
      expect(releaseBlockers({ ...base, state, readHash: 'a' })).toHaveLength(1);
    }
  });
});

describe('the rules that clear', () => {
  const sheet = (content = aVersion().plain()) => {
    const { design } = designOf(content);
    const verdict = evaluate(design, { boxes: 2000, seed: 1 });
    const findings = allFindings(verdict, content);
    return { cleared: clearedRules(verdict, content, findings), findings };
  };

  it('stand with the figure each clears by', () => {
    const { cleared } = sheet();
    expect(cleared.find(({ code }) => code === 'BAND-LOW')?.figure).toMatch(/^4\d\d\u202fkHz$/);
    expect(cleared.find(({ title }) => title.startsWith('Every carrier'))?.figure).toBe('120 carriers');
    expect(cleared.find(({ code }) => code === 'WIRE-SHORT')?.figure).toBe('13.5\u202fm');
  });

  it('never promise all boxes as a percentage', () => {
    expect(JSON.stringify(sheet().cleared)).not.toContain('100.0');
    expect(JSON.stringify(sheet().cleared)).not.toContain('100\u202f%');
  });

  it('leave out each rule that stops or is noted', () => {
    const { cleared, findings } = sheet(aVersion().withTurns(40).withPart('E1', 'E-32').plain());
    const standing = findings.filter(({ severity }) => severity !== 'info').map(({ code }) => code);
    expect(standing).toEqual(expect.arrayContaining(['BAND-LOW', 'PHONE-Z']));
    for (const code of standing) expect(cleared.map((one) => one.code)).not.toContain(code);
  });
});
