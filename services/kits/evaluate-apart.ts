import { Worker } from 'node:worker_threads';
import { Problem } from '../problem';
import { canonicalJson, sha256 } from '../record';
import { ENGINE_VERSION, defaultRules } from '../receiver';
import { type Evaluation, type EvaluationOptions, evaluateContent } from './evaluation';
import type { VersionContent } from './schemas';
import type { ThreadAnswer, ThreadTask } from './thread';

/** Boxes and seed of every verdict that counts: sheet, sign-off and certificate. */
export const JUDGED = { boxes: 20_000, seed: 1 } as const;

/** The same content, engine, rules, seed and boxes give the same verdict, so the last few are kept. */
const kept = new Map<string, Evaluation>();
const KEEP = 40;

/**
 * Evaluates a version's content in a thread of its own, so that a second's work holds nobody up. Scripts and tests,
 * which no one waits on and whose loader starts no TypeScript thread, do it in place.
 */
export async function evaluateApart(content: VersionContent, options: EvaluationOptions): Promise<Evaluation> {
  const key = sha256(canonicalJson({ content, options, engine: ENGINE_VERSION, rules: defaultRules }));
  const known = kept.get(key);
  if (known) return known;
  // Next sets this while it bundles; it is absent under tsx and vitest.
  const evaluation =
    process.env['NEXT_RUNTIME'] === 'nodejs' ? await inThread({ content, options }) : evaluateContent(content, options);
  kept.set(key, evaluation);
  const [oldest] = kept.keys();
  if (kept.size > KEEP && oldest !== undefined) kept.delete(oldest);
  return evaluation;
}

function inThread(task: ThreadTask): Promise<Evaluation> {
  return new Promise((resolve, reject) => {
    const worker = new Worker(new URL('./thread.ts', import.meta.url), { workerData: task });
    worker.once('message', (answer: ThreadAnswer) => {
      if (answer.ok) resolve(answer.evaluation);
      else
        reject(
          new Problem(
            answer.problem.kind,
            answer.problem.sentence,
            answer.problem.fields ? { fields: answer.problem.fields } : {},
          ),
        );
    });
    worker.once('error', reject);
    worker.once('exit', () => reject(new Error('The evaluation ended without an answer.')));
  });
}
