import { parentPort, workerData } from 'node:worker_threads';
import { Problem, type ProblemView } from '../problem';
import { type Evaluation, type EvaluationOptions, evaluateContent } from './evaluation';
import { VersionContent } from './schemas';

/** What a thread is given, and what it answers once before it ends. */
export interface ThreadTask {
  content: VersionContent;
  options: EvaluationOptions;
}
export type ThreadAnswer = { ok: true; evaluation: Evaluation } | { ok: false; problem: ProblemView };

const { content, options }: ThreadTask = workerData;
parentPort?.postMessage(answer());

function answer(): ThreadAnswer {
  try {
    return { ok: true, evaluation: evaluateContent(VersionContent.parse(content), options) };
  } catch (error) {
    if (error instanceof Problem) return { ok: false, problem: error.view() };
    throw error;
  }
}
