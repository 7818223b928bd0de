import type { ActionResult } from '@/components/forms/action-result';
import type { ProblemView } from '@/services/problem';
import type {
  Circuit,
  Guide,
  LineView,
  NewLine,
  RemoveLine,
  SaveCircuit,
  SaveGuide,
  SaveLine,
  VersionContent,
  VersionView,
} from '@/services/kits/schemas';
import { type FieldConflict, mergeFields, settled } from './merge-fields';

type Deed<Input> = (input: Input) => Promise<ActionResult<VersionView>>;

export interface VersionDeeds {
  saveCircuit: Deed<SaveCircuit>;
  saveGuide: Deed<SaveGuide>;
  addLine: Deed<NewLine>;
  saveLine: Deed<SaveLine>;
  removeLine: Deed<RemoveLine>;
}

export type SaveState =
  /** `earlier`: before the page was opened, so that its day is said too. */
  | { kind: 'saved'; at: number; earlier?: true }
  | { kind: 'waiting' }
  | { kind: 'saving' }
  /** Nothing is lost; "Try again" sends it once more. */
  | { kind: 'failed'; problem: ProblemView }
  | { kind: 'conflict' };

type Whole = 'circuit' | 'guide';
export type LineChange = Partial<
  Pick<LineView, 'partId' | 'quantity' | 'note' | 'reference' | 'place' | 'part' | 'costMinor'>
>;

/** Both values of what two people changed, for the reader to choose from. */
export interface Conflict {
  what: Whole | 'line';
  fields: FieldConflict[];
  theirs: VersionView;
}

export interface VersionSnapshot {
  /** As the server last said. */
  server: VersionView;
  circuit: Circuit;
  guide: Guide;
  lines: readonly LineView[];
  /** What the version is with everything that is on screen. */
  content: VersionContent;
  save: SaveState;
  conflict: Conflict | null;
  canUndo: boolean;
  canRedo: boolean;
}

/** How long nothing is typed before it is sent. */
const PAUSE_MS = 600;
const MOST_STEPS = 100;

/**
 * What is typed into a version, and its way to the server: shown at once, sent after a pause, one save after the other.
 * A save that somebody overtook is joined with theirs where the fields differ; where they are the same, both values
 * wait for the reader's choice. What was typed stays whatever the answer is.
 */
export class VersionStore {
  private readonly listeners = new Set<() => void>();
  private snapshot: VersionSnapshot;
  private readonly changed = new Set<Whole>();
  private readonly changedLines = new Set<string>();
  private readonly past: Circuit[] = [];
  private readonly future: Circuit[] = [];
  private timer: ReturnType<typeof setTimeout> | undefined;
  private running: Promise<void> = Promise.resolve();

  constructor(
    view: VersionView,
    private readonly deeds: VersionDeeds,
    private readonly clock: () => number = Date.now,
  ) {
    this.snapshot = {
      server: view,
      circuit: view.content.circuit,
      guide: view.content.guide,
      lines: view.lines,
      content: view.content,
      save: { kind: 'saved', at: view.updatedAt, earlier: true },
      conflict: null,
      canUndo: false,
      canRedo: false,
    };
  }

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };
  readonly read = (): VersionSnapshot => this.snapshot;

  readonly changeCircuit = (circuit: Circuit): void => {
    this.past.push(this.snapshot.circuit);
    if (this.past.length > MOST_STEPS) this.past.shift();
    this.future.length = 0;
    this.putCircuit(circuit);
  };

  readonly undo = (): void => this.step(this.past, this.future);
  readonly redo = (): void => this.step(this.future, this.past);

  readonly changeGuide = (guide: Guide): void => {
    this.changed.add('guide');
    this.show({ guide });
    this.later();
  };

  readonly changeLine = (id: string, change: LineChange): void => {
    this.changedLines.add(id);
    this.show({ lines: this.snapshot.lines.map((line) => (line.id === id ? { ...line, ...change } : line)) });
    this.later();
  };

  /** Adding and removing go out at once; the answer is the problem, or null when it is done. */
  readonly addLine = (line: NewLine): Promise<ProblemView | null> => this.now(() => this.deeds.addLine(line));
  readonly removeLine = (lineId: LineView['id']): Promise<ProblemView | null> => {
    this.changedLines.delete(lineId);
    return this.now(() => this.deeds.removeLine({ lineId }));
  };

  /** Sends what waits without waiting for the pause. */
  readonly saveNow = (): Promise<void> => {
    clearTimeout(this.timer);
    this.running = this.running.then(() => this.sendAll());
    return this.running;
  };

  /** Settles a conflict: for each field, mine or theirs. */
  readonly settle = (choices: ReadonlyMap<string, 'mine' | 'theirs'>): void => {
    const { conflict } = this.snapshot;
    if (!conflict) return;
    const { theirs, fields, what } = conflict;
    if (what === 'line') {
      const [field] = fields;
      if (field && choices.get(field.path) !== 'mine') this.changedLines.delete(field.path);
      this.show({ conflict: null, server: theirs, lines: this.mergedLines(theirs) });
    } else {
      const chosen = settled(what === 'circuit' ? theirs.content.circuit : theirs.content.guide, fields, choices);
      this.show({ conflict: null, server: theirs, [what]: chosen, lines: this.mergedLines(theirs) });
    }
    void this.saveNow();
  };

  private putCircuit(circuit: Circuit): void {
    this.changed.add('circuit');
    this.show({ circuit, canUndo: this.past.length > 0, canRedo: this.future.length > 0 });
    this.later();
  }

  private step(from: Circuit[], to: Circuit[]): void {
    const circuit = from.pop();
    if (!circuit) return;
    to.push(this.snapshot.circuit);
    this.putCircuit(circuit);
  }

  private later(): void {
    if (this.snapshot.conflict) return;
    this.show({ save: { kind: 'waiting' } });
    clearTimeout(this.timer);
    this.timer = setTimeout(() => void this.saveNow(), PAUSE_MS);
  }

  private async sendAll(): Promise<void> {
    for (;;) {
      if (this.snapshot.conflict) return;
      const send = this.nextSave();
      if (!send) break;
      this.show({ save: { kind: 'saving' } });
      const problem = await send();
      if (problem && !this.snapshot.conflict) {
        this.show({ save: { kind: 'failed', problem } });
        return;
      }
    }
    if (this.snapshot.save.kind !== 'saved') this.show({ save: { kind: 'saved', at: this.clock() } });
  }

  private nextSave(): (() => Promise<ProblemView | null>) | null {
    const { server, circuit, guide } = this.snapshot;
    const basedOn = server.saveNo;
    for (const what of this.changed) {
      return () =>
        this.saveWhole(
          what,
          what === 'circuit'
            ? () => this.deeds.saveCircuit({ versionId: server.id, circuit, basedOn })
            : () => this.deeds.saveGuide({ versionId: server.id, guide, basedOn }),
        );
    }
    for (const id of this.changedLines) {
      const line = this.snapshot.lines.find((one) => one.id === id);
      if (!line) this.changedLines.delete(id);
      else return () => this.saveLine(line);
    }
    return null;
  }

  private async saveWhole(what: Whole, send: () => Promise<ActionResult<VersionView>>): Promise<ProblemView | null> {
    const sent = this.snapshot[what];
    this.changed.delete(what);
    const answer = await attempt(send);
    if (answer.ok) {
      this.take(answer.value);
      return null;
    }
    this.changed.add(what);
    const theirs = versionIn(answer.problem);
    if (!theirs) return answer.problem;
    const base = this.snapshot.server.content[what];
    const merged = mergeFields({ base, mine: this.snapshot[what] ?? sent, theirs: theirs.content[what] });
    if (merged.conflicts.length === 0) {
      this.show({ server: theirs, [what]: merged.value, lines: this.mergedLines(theirs) });
      return null;
    }
    this.show({ conflict: { what, fields: merged.conflicts, theirs }, save: { kind: 'conflict' } });
    return null;
  }

  private async saveLine(line: LineView): Promise<ProblemView | null> {
    this.changedLines.delete(line.id);
    const { id, reference, place, partId, quantity, note, saveNo } = line;
    const answer = await attempt(() =>
      this.deeds.saveLine({ lineId: id, reference, place, partId, quantity, note, basedOn: saveNo }),
    );
    if (answer.ok) {
      this.take(answer.value);
      return null;
    }
    this.changedLines.add(id);
    const theirs = versionIn(answer.problem);
    const other = theirs?.lines.find((one) => one.id === id);
    if (!theirs || !other) return answer.problem;
    const words = (one: LineView) => `${one.part?.name ?? 'no part'}, ${one.quantity}`;
    const field = {
      path: id,
      label: `line ${reference}`,
      mine: words(line),
      theirs: words(other),
      values: { mine: line, theirs: other },
    };
    this.show({ conflict: { what: 'line', fields: [field], theirs }, save: { kind: 'conflict' } });
    return null;
  }

  private now(send: () => Promise<ActionResult<VersionView>>): Promise<ProblemView | null> {
    const turn = this.running.then(async () => {
      await this.sendAll();
      this.show({ save: { kind: 'saving' } });
      const answer = await attempt(send);
      if (answer.ok) this.take(answer.value);
      this.show({
        save: answer.ok ? { kind: 'saved', at: this.clock() } : { kind: 'saved', at: this.snapshot.server.updatedAt },
      });
      return answer.ok ? null : answer.problem;
    });
    this.running = turn.then(() => undefined);
    return turn;
  }

  /** The server's answer, with whatever was typed while it was under way. */
  private take(server: VersionView): void {
    this.show({
      server,
      ...(!this.changed.has('circuit') && { circuit: server.content.circuit }),
      ...(!this.changed.has('guide') && { guide: server.content.guide }),
      lines: this.mergedLines(server),
    });
  }

  private mergedLines(server: VersionView): LineView[] {
    return server.lines.map((line) => {
      const mine = this.changedLines.has(line.id) ? this.snapshot.lines.find((one) => one.id === line.id) : undefined;
      return mine ? { ...mine, saveNo: line.saveNo } : line;
    });
  }

  private show(change: Partial<VersionSnapshot>): void {
    const next = { ...this.snapshot, ...change };
    const touches = change.circuit ?? change.guide ?? change.lines ?? change.server;
    this.snapshot = touches ? { ...next, content: contentWith(next) } : next;
    for (const listener of this.listeners) listener();
  }
}

const contentWith = ({ server, circuit, guide, lines }: VersionSnapshot): VersionContent => ({
  ...server.content,
  circuit,
  guide,
  lines: lines.map(({ reference, place, quantity, note, part }) => ({ reference, place, quantity, note, part })),
});

/** The other's version that a conflict carries. */
function versionIn({ kind, current }: ProblemView): VersionView | null {
  if (kind !== 'conflict' || typeof current !== 'object' || current === null || !('version' in current)) return null;
  // It comes from our own action, which sends the view that `kits` made.
  return current.version as VersionView;
}

async function attempt(send: () => Promise<ActionResult<VersionView>>): Promise<ActionResult<VersionView>> {
  try {
    return await send();
  } catch {
    const sentence = 'No line to the yard. What you typed is kept here; it is sent when you press "Try again".';
    return { ok: false, problem: { kind: 'unavailable', sentence } };
  }
}
