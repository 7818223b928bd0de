import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { mergeFields } from '@/components/bench/merge-fields';
import { type VersionDeeds, VersionStore } from '@/components/bench/version-store';
import type { ActionResult } from '@/components/forms/action-result';
import { KitId, LineId, VersionId, newId } from '@/services/ids';
import type { Circuit, VersionView } from '@/services/kits/schemas';
import { aVersion } from '../../builders/versions';

/** What the yard's server would hold of one version, and the deeds that change it. */
function aYard() {
  let view = freshView();
  let isCut = false;
  const sent: string[] = [];
  const next = (change: Partial<VersionView>): VersionView => ({ ...view, ...change, saveNo: view.saveNo + 1 });
  const answer = (input: { basedOn: number }, change: () => VersionView): ActionResult<VersionView> => {
    if (isCut) throw new TypeError('fetch failed');
    if (input.basedOn !== view.saveNo) {
      return { ok: false, problem: { kind: 'conflict', sentence: 'Somebody changed it.', current: { version: view } } };
    }
    view = change();
    return { ok: true, value: view };
  };
  const withCircuit = (circuit: Circuit) => next({ content: { ...view.content, circuit } });
  const deeds: VersionDeeds = {
    saveCircuit: async (input) => {
      sent.push(`circuit ${input.circuit.winding.turns}`);
      return answer(input, () => withCircuit(input.circuit));
    },
    saveGuide: async (input) => answer(input, () => next({ content: { ...view.content, guide: input.guide } })),
    addLine: async () => ({ ok: true, value: next({}) }),
    saveLine: async (input) => {
      sent.push(`line ${input.reference} ${input.quantity}`);
      return answer({ basedOn: view.saveNo }, () =>
        next({
          lines: view.lines.map((line) =>
            line.id === input.lineId ? { ...line, quantity: input.quantity, saveNo: line.saveNo + 1 } : line,
          ),
        }),
      );
    },
    removeLine: async () => ({ ok: true, value: next({}) }),
  };
  return {
    deeds,
    sent,
    get view() {
      return view;
    },
    /** Somebody else saves. */
    elsewhere(change: (circuit: Circuit) => Circuit) {
      view = withCircuit(change(view.content.circuit));
    },
    cutTheLine(cut: boolean) {
      isCut = cut;
    },
  };
}

function freshView(): VersionView {
  const content = aVersion().plain();
  return {
    id: VersionId.parse(newId()),
    kitId: KitId.parse(newId()),
    letter: 'A',
    state: 'draft',
    saveNo: 5,
    content,
    contentHash: null,
    lines: content.lines.map((line, position) => ({
      ...line,
      id: LineId.parse(newId()),
      position,
      saveNo: 1,
      partId: null,
      costMinor: 0,
      retired: false,
    })),
    editors: [],
    own: true,
    createdAt: 0,
    updatedAt: 0,
    sentAt: null,
    siblings: [],
    held: null,
  };
}

const withTurns = (circuit: Circuit, turns: number): Circuit => ({
  ...circuit,
  winding: { ...circuit.winding, turns },
});
const pause = () => vi.advanceTimersByTimeAsync(700);

beforeEach(() => void vi.useFakeTimers());
afterEach(() => void vi.useRealTimers());

describe('what is typed on the bench', () => {
  it('stands on screen at once and is sent once, after a pause', async () => {
    const yard = aYard();
    const store = new VersionStore(yard.view, yard.deeds);
    for (const turns of [73, 74, 75]) store.changeCircuit(withTurns(store.read().circuit, turns));
    expect(store.read().content.circuit.winding.turns).toBe(75);
    expect(store.read().save.kind).toBe('waiting');
    await pause();
    expect(yard.sent).toEqual(['circuit 75']);
    expect(store.read().save.kind).toBe('saved');
  });

  it('is joined with what somebody else changed elsewhere, and nobody is asked', async () => {
    const yard = aYard();
    const store = new VersionStore(yard.view, yard.deeds);
    yard.elsewhere((circuit) => ({ ...circuit, detectorAt: 'tap' }));
    store.changeCircuit(withTurns(store.read().circuit, 80));
    await pause();
    expect(store.read().conflict).toBeNull();
    expect(yard.view.content.circuit).toMatchObject({ detectorAt: 'tap', winding: { turns: 80 } });
    expect(store.read().circuit.detectorAt).toBe('tap');
  });

  it('shows both values when two people set the same one, and keeps the one that is chosen', async () => {
    const yard = aYard();
    const store = new VersionStore(yard.view, yard.deeds);
    yard.elsewhere((circuit) => withTurns({ ...circuit, detectorAt: 'tap' }, 90));
    store.changeCircuit(withTurns(store.read().circuit, 80));
    await pause();
    const { conflict } = store.read();
    expect(conflict?.fields).toMatchObject([{ label: 'Turns', mine: '80', theirs: '90' }]);
    expect(store.read().circuit.winding.turns).toBe(80);
    store.settle(new Map([['winding.turns', 'mine']]));
    await pause();
    expect(yard.view.content.circuit).toMatchObject({ detectorAt: 'tap', winding: { turns: 80 } });
    expect(store.read()).toMatchObject({ conflict: null, save: { kind: 'saved' } });
  });

  it('takes theirs when that is chosen', async () => {
    const yard = aYard();
    const store = new VersionStore(yard.view, yard.deeds);
    yard.elsewhere((circuit) => withTurns(circuit, 90));
    store.changeCircuit(withTurns(store.read().circuit, 80));
    await pause();
    store.settle(new Map([['winding.turns', 'theirs']]));
    await pause();
    expect(store.read().circuit.winding.turns).toBe(90);
    expect(yard.view.content.circuit.winding.turns).toBe(90);
  });

  it('is kept when the line is cut, and sent when it is tried again', async () => {
    const yard = aYard();
    const store = new VersionStore(yard.view, yard.deeds);
    yard.cutTheLine(true);
    store.changeCircuit(withTurns(store.read().circuit, 81));
    await pause();
    expect(store.read().save).toMatchObject({ kind: 'failed', problem: { kind: 'unavailable' } });
    expect(store.read().circuit.winding.turns).toBe(81);
    yard.cutTheLine(false);
    await store.saveNow();
    expect(yard.view.content.circuit.winding.turns).toBe(81);
    expect(store.read().save.kind).toBe('saved');
  });

  it('can be undone and done again, each sent like any change', async () => {
    const yard = aYard();
    const store = new VersionStore(yard.view, yard.deeds);
    store.changeCircuit(withTurns(store.read().circuit, 80));
    await pause();
    store.undo();
    await pause();
    expect(yard.view.content.circuit.winding.turns).toBe(72);
    store.redo();
    await pause();
    expect(yard.view.content.circuit.winding.turns).toBe(80);
    expect(yard.sent).toEqual(['circuit 80', 'circuit 72', 'circuit 80']);
  });

  it('goes out one save after the other, circuit and lines alike', async () => {
    const yard = aYard();
    const store = new VersionStore(yard.view, yard.deeds);
    const wire = store.read().lines.find((line) => line.reference === 'L1');
    if (!wire) throw new Error('no wire');
    store.changeCircuit(withTurns(store.read().circuit, 76));
    store.changeLine(wire.id, { quantity: 14_200 });
    await pause();
    expect(yard.sent).toEqual(['circuit 76', 'line L1 14200']);
    expect(store.read().lines.find((line) => line.id === wire.id)?.quantity).toBe(14_200);
    expect(store.read().circuit.winding.turns).toBe(76);
  });
});

describe('joining two changes', () => {
  const base = { a: 1, deep: { b: 2, list: [1, 2] } };
  it('keeps what each changed alone', () => {
    const merged = mergeFields({ base, mine: { ...base, a: 9 }, theirs: { ...base, deep: { ...base.deep, b: 7 } } });
    expect(merged).toEqual({ value: { a: 9, deep: { b: 7, list: [1, 2] } }, conflicts: [] });
  });
  it('takes a list as one thing', () => {
    const mine = { ...base, deep: { ...base.deep, list: [1, 2, 3] } };
    const theirs = { ...base, deep: { ...base.deep, list: [2] } };
    expect(mergeFields({ base, mine, theirs }).conflicts.map(({ path }) => path)).toEqual(['deep.list']);
  });
  it('sees no conflict where both came to the same', () => {
    expect(mergeFields({ base, mine: { ...base, a: 5 }, theirs: { ...base, a: 5 } }).conflicts).toEqual([]);
  });
});
