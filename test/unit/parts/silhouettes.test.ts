import { describe, expect, test } from 'vitest';
import { demoParts } from '@/db/demo/parts';
import { HardwareDrawing, PartValues, partKinds, silhouetteOf } from '@/services/parts/schemas';
import { isPartFamily } from '@/templates/drawings/part-drawing';

describe('how a part is drawn', () => {
  test('hardware as its own drawing says, and as a packet where none is given', () => {
    expect(silhouetteOf({ kind: 'hardware', drawing: 'board' })).toBe('board');
    expect(silhouetteOf({ kind: 'hardware', drawing: 'screw' })).toBe('screw');
    expect(silhouetteOf({ kind: 'hardware' })).toBe('packet');
    expect(PartValues.safeParse({ kind: 'hardware', drawing: 'anvil' }).success).toBe(false);
  });

  test('a pair of capsules as a headset, a ceramic phone as an earpiece', () => {
    const ohm = { nominal: 2000, origin: 'maker' as const };
    expect(silhouetteOf({ kind: 'earphone', earphoneKind: 'magnetic', rDc: ohm, r: ohm, x: 0 })).toBe('headset');
    const c = { nominal: 1.5e-8, origin: 'maker' as const };
    expect(silhouetteOf({ kind: 'earphone', earphoneKind: 'ceramic', c, rDc: ohm })).toBe('earpiece');
  });

  test('every kind and every drawing of hardware has a silhouette that is drawn', () => {
    const named = [...Object.values(partKinds).map(({ silhouette }) => silhouette), ...HardwareDrawing.options];
    expect(named.filter((name) => !isPartFamily(name))).toEqual([]);
  });

  test('the demo yard tells a board, a knob, a screw and sandpaper from a terminal', () => {
    const drawn = (code: string) => {
      const part = demoParts.find((one) => one.code === code);
      return part && silhouetteOf(part.values);
    };
    expect(['X-TERM', 'X-BOARD', 'X-KNOB', 'X-SCREW', 'X-PAPER'].map(drawn)).toEqual([
      'terminal',
      'board',
      'knob',
      'screw',
      'packet',
    ]);
  });
});
