import { CATALOGUE } from '../findings/catalogue';
import type { DesignInput } from '../design';
import { InvalidInput } from '../invalid-input';
import { canonicalJson, sha256 } from '../numeric/digest';
import { survey } from '../survey';
import { designFrom, readChoice, settled, type Choice, type SeekAsk, type Settled } from './ask';
import { inOrder, listed, partsKey, type Candidate } from './ranking';
import { readLists } from './read-lists';
import { screenOf, type Screen } from './screen';
import { mostMissed } from './trial';
import { combinationsOf, fieldOf, placementsOf, totalOf } from './windings';

/** Where a search stands; a plain value that can be stored and taken up again with the same ask. */
export interface SeekCursor {
  /** Digest of the ask it belongs to. */
  of: string;
  phase: 'screen' | 'judge' | 'done';
  pair: number;
  /** Turns that come next; 0 for the fewest of the pair. */
  turns: number;
  windings: number;
  seen: number;
  judged: number;
  waiting: Candidate[];
  clears: Candidate[];
}

export interface SeekProgress {
  done: boolean;
  windings: { done: number; total: number };
  /** Combinations decided by a bound, and worked out in full; together with those that wait, all that were seen. */
  combinations: { byBound: number; inFull: number; waiting: number; total: number };
}

export interface SeekResult extends Candidate {
  design: DesignInput;
}

export interface Seeker {
  /** One small piece of work: a winding looked through, or a combination judged in full. */
  step(): SeekProgress;
  progress(): SeekProgress;
  /** Designs that clear every rule, in order, as far as is known. */
  results(): SeekResult[];
  cursor(): SeekCursor;
}

/** Combinations that wait at most before the best of them are judged. */
const MOST_WAITING = 20000;

/** Whether a combination clears every rule, boxes included. */
function clearsEveryRule(ask: Settled, choice: Choice): boolean {
  const design = readChoice(ask, choice);
  if (design === null) return false;
  const { seed, boxes, rules } = ask;
  const figures = survey(design, { seed, boxes, rules, depth: 'share', mostMissed: mostMissed(boxes, rules) });
  return CATALOGUE.every(([, look]) => look(figures).every((found) => found.severity !== 'stop'));
}

/**
 * Looks through every combination of the lists and finds the first designs, in the order asked for, that clear every
 * rule. Most combinations are dismissed by bounds; the list is the same as if each were worked out. Take steps until it
 * is done, stop between any two, and go on later from the cursor.
 * @throws InvalidInput where a part cannot be, or the cursor belongs to another ask
 */
export function seek(asked: SeekAsk, from?: SeekCursor): Seeker {
  const ask = settled(asked);
  const of = sha256(canonicalJson(asked));
  if (from !== undefined && from.of !== of)
    throw new InvalidInput([{ path: 'cursor', message: 'This cursor belongs to another search: begin a new one.' }]);
  const field = fieldOf(ask);
  const read = readLists(ask, field);
  const total = read === null ? { windings: 0, combinations: 0 } : totalOf(ask, field);
  const screen: Screen | null = read === null ? null : screenOf(ask, field, read);
  const state: SeekCursor =
    from === undefined
      ? { of, phase: 'screen', pair: 0, turns: 0, windings: 0, seen: 0, judged: 0, waiting: [], clears: [] }
      : { ...from, waiting: [...from.waiting], clears: [...from.clears] };
  if (screen === null) state.phase = 'done';
  let list = listed(ask, state.clears);

  const last = (): Candidate | null => (list.length < ask.most ? null : (list[list.length - 1] ?? null));
  const mayBeListed = (candidate: Candidate): boolean => {
    const worst = last();
    return worst === null || inOrder(ask.rank, candidate, worst) < 0;
  };
  /** Whether enough windings of the same parts are listed before it. */
  const isCrowded = (candidate: Candidate): boolean => {
    const key = partsKey(candidate.choice);
    const before = (other: Candidate): boolean =>
      partsKey(other.choice) === key && inOrder(ask.rank, other, candidate) < 0;
    return state.clears.filter(before).length >= ask.windingsEach;
  };

  const lookThroughWinding = (): void => {
    const pair = field.pairs[state.pair];
    if (pair === undefined || screen === null) {
      toJudging();
      return;
    }
    const turns = state.turns === 0 ? pair.least : state.turns;
    const worst = last();
    const { guardNominal } = ask.rules;
    const guard =
      ask.rank === 'margin' && worst !== null ? Math.max(guardNominal, worst.margin * (1 - 1e-12)) : guardNominal;
    const { former, wire } = pair;
    for (const candidate of screen.candidates({ former, wire, turns }, guard, mayBeListed))
      state.waiting.push(candidate);
    state.seen += combinationsOf(field, placementsOf(ask, field, turns).length);
    state.windings += 1;
    state.turns = turns + 1;
    if (turns >= pair.most) {
      state.pair += 1;
      state.turns = 0;
    }
    if (state.waiting.length > MOST_WAITING) toJudging();
  };

  const toJudging = (): void => {
    // The best stands last, so that taking it moves nothing.
    state.waiting.sort((a, b) => inOrder(ask.rank, b, a));
    state.phase = 'judge';
  };

  /** Puts a combination back where its margin, now worked out, places it. */
  const putBack = (candidate: Candidate): void => {
    let low = 0;
    let high = state.waiting.length;
    while (low < high) {
      const middle = (low + high) >> 1;
      const other = state.waiting[middle];
      if (other !== undefined && inOrder(ask.rank, other, candidate) > 0) low = middle + 1;
      else high = middle;
    }
    state.waiting.splice(low, 0, candidate);
  };

  /** The best that waits and is not beaten by its own kind, its margin worked out. */
  const nextWaiting = (): Candidate | undefined => {
    for (;;) {
      const candidate = state.waiting.pop();
      if (candidate === undefined || screen === null) return undefined;
      if (isCrowded(candidate)) continue;
      if (candidate.exact || !mayBeListed(candidate)) return candidate;
      const margin = screen.marginOf(candidate.choice);
      if (margin >= ask.rules.guardNominal) putBack({ ...candidate, margin, exact: true });
    }
  };

  const judgeNext = (): void => {
    const candidate = nextWaiting();
    if (candidate === undefined || !mayBeListed(candidate)) {
      state.waiting = [];
      state.phase = state.pair < field.pairs.length ? 'screen' : 'done';
      return;
    }
    state.judged += 1;
    if (!clearsEveryRule(ask, candidate.choice)) return;
    state.clears.push(candidate);
    list = listed(ask, state.clears);
    // What clears but stands behind the list can never come back.
    if (last() !== null) state.clears = [...list];
  };

  const progress = (): SeekProgress => {
    const waiting = state.waiting.length;
    return {
      done: state.phase === 'done',
      windings: { done: state.windings, total: total.windings },
      combinations: {
        byBound: state.seen - state.judged - waiting,
        inFull: state.judged,
        waiting,
        total: total.combinations,
      },
    };
  };

  return {
    progress,
    step() {
      if (state.phase === 'screen') lookThroughWinding();
      else if (state.phase === 'judge') judgeNext();
      return progress();
    },
    results: () => list.map((candidate) => ({ ...candidate, design: designFrom(ask, candidate.choice) })),
    cursor: () => ({ ...state, waiting: [...state.waiting], clears: [...state.clears] }),
  };
}
