import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { coverSentence } from '@/components/devices/cover-rail';
import { Gate, gateSentence } from '@/components/devices/gate';
import { PartLabel } from '@/components/devices/part-label';
import { Plate } from '@/components/devices/plate';
import { StatusSign } from '@/components/devices/status-sign';
import { TerminalStrip } from '@/components/devices/terminal-strip';
import { TrayPlace } from '@/components/devices/tray';
import { WindingMark } from '@/components/devices/winding-mark';

/** What somebody sees or hears: the markup without its tags. */
const read = (element: React.ReactElement) =>
  renderToStaticMarkup(element)
    .replace(/<[^>]+>/g, ' ')
    .replace(/\s+/g, ' ')
    .trim();

describe('a state is never told by colour alone', () => {
  it('every winding mark carries its word and its own number of turns', () => {
    const seen = (['draft', 'in-check', 'released', 'held', 'withdrawn'] as const).map((state) => {
      const markup = renderToStaticMarkup(<WindingMark state={state} />);
      return { words: read(<WindingMark state={state} />), turns: markup.match(/stroke-width="5.5"/g)?.length };
    });
    expect(seen).toEqual([
      { words: 'Draft', turns: 2 },
      { words: 'In check', turns: 4 },
      { words: 'Released', turns: 5 },
      { words: 'Held', turns: 4 },
      { words: 'Withdrawn', turns: 5 },
    ]);
  });

  it('every sign has a word and a shape of its own', () => {
    const kinds = ['clears', 'note', 'stops', 'info', 'waiting'] as const;
    expect(kinds.map((kind) => read(<StatusSign kind={kind} />))).toEqual([
      'Clears',
      'Note',
      'Stops',
      'Info',
      'Waiting',
    ]);
    const shapes = kinds.map((kind) =>
      renderToStaticMarkup(<StatusSign kind={kind} />)
        .replace(/(class|fill|stroke)="[^"]*"/g, '')
        .replace(/<b.*/, ''),
    );
    expect(new Set(shapes).size).toBe(5);
  });
});

describe('a plate', () => {
  it('shows number and letter, and reads them out whole', () => {
    expect(read(<Plate kit={7} version="B" />)).toBe('Kit number 7, version B No. 7 B');
  });
});

describe('a gate', () => {
  const gate = { lo: 761, hi: 820, unit: 'kHz', measure: 'Low end' };

  it('says whether a reading lies inside, under or over', () => {
    expect(gateSentence({ ...gate, reading: 788 })).toBe('Low end: 788 kHz, inside the gate of 761 to 820 kHz.');
    expect(gateSentence({ ...gate, reading: 760 })).toContain('under the gate');
    expect(gateSentence({ ...gate, reading: 821 })).toContain('over the gate');
    expect(gateSentence({ ...gate, reading: null })).toBe('Low end: not read yet, the gate is 761 to 820 kHz.');
  });

  it('counts its own edges as inside', () => {
    expect(gateSentence({ ...gate, reading: 761 })).toContain('inside');
    expect(gateSentence({ ...gate, reading: 820 })).toContain('inside');
  });

  it('crosses the needle only outside', () => {
    const crossed = (reading: number) =>
      renderToStaticMarkup(<Gate {...gate} reading={reading} />).includes('m0-9l-10 9');
    expect(crossed(900)).toBe(true);
    expect(crossed(788)).toBe(false);
  });
});

describe('a parts line', () => {
  it('says which tolerance it has, and that it has none', () => {
    const label = { reference: 'L1', drawing: null, name: 'Basket coil' };
    expect(renderToStaticMarkup(<PartLabel {...label} tolerance={3} measured={-0.4} />)).toContain(
      'Tolerance plus or minus 3 percent, measured minus 0.4 percent',
    );
    expect(read(<PartLabel {...label} />)).toContain('no value');
  });
});

describe('a tray', () => {
  it('tells what each place waits for', () => {
    const place = { name: 'Detector', drawing: null, have: 0, need: 2, bin: 'C-14' };
    expect(read(<TrayPlace {...place} state="next" />)).toBe('Detector Next 0 of 2 bin C-14');
    expect(read(<TrayPlace {...place} state="waiting" />)).toContain('waiting');
    expect(read(<TrayPlace {...place} state="wrong" />)).toContain('Not in this box');
    expect(read(<TrayPlace {...place} have={2} state="in" />)).toBe('Detector in the tray 2 of 2');
    expect(read(<TrayPlace {...place} state="bin-empty" />)).toContain('Bin empty');
  });
});

describe('a terminal strip', () => {
  it('lists its stages in order and marks where things stand', () => {
    const strip = (
      <TerminalStrip label="Your order" done={2} stages={[{ name: 'Paid' }, { name: 'Picked' }, { name: 'Packed' }]} />
    );
    expect(read(strip)).toBe('Paid Picked, now Packed , not yet');
    expect(renderToStaticMarkup(strip).match(/aria-current="step"/g)).toHaveLength(1);
  });

  it('has no now once all is done and finished', () => {
    const strip = (
      <TerminalStrip label="Your order" done={2} isFinished stages={[{ name: 'Sent' }, { name: 'Delivered' }]} />
    );
    expect(read(strip)).toBe('Sent Delivered');
  });
});

describe('cover', () => {
  it('says how many weeks are missing until the parts can come', () => {
    expect(coverSentence({ weeks: 2.1, restock: 4 })).toBe('2.1 weeks in hand, 4 to restock: short by 1.9 weeks.');
    expect(coverSentence({ weeks: 9, restock: 4 })).toBe('9 weeks in hand, 4 to restock.');
  });
});
