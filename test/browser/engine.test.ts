import { build } from 'esbuild';
import fc from 'fast-check';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import type { Browser, Page } from 'playwright-core';
import { canonicalJson, evaluate, InvalidInput } from '@/services/receiver';
import { root } from '../../db/demo/steps.mjs';
import { anyDesign } from '../unit/receiver/any-design';
import { nearDesign } from '../unit/receiver/near-design';
import { launch } from './visitor';

/** Boxes a design; the draws are part of what has to agree. */
const BOXES = 400;
const designs = [
  ...fc.sample(anyDesign, { numRuns: 380, seed: 20261201 }),
  ...fc.sample(nearDesign, { numRuns: 120, seed: 20261202 }),
];

/** Text of a verdict, or of what is wrong with the design. */
function judged(design: unknown): string {
  try {
    return canonicalJson(evaluate(design, { boxes: BOXES }));
  } catch (error) {
    if (error instanceof InvalidInput) return canonicalJson(error.issues);
    throw error;
  }
}

/** The same, as a page and a worker do it with the engine in one file. */
const ENTRY = `
import { canonicalJson, evaluate, InvalidInput } from '@/services/receiver';
const judged = (design) => {
  try { return canonicalJson(evaluate(design, { boxes: ${BOXES} })); }
  catch (error) { if (error instanceof InvalidInput) return canonicalJson(error.issues); throw error; }
};
globalThis.judgeAll = (text) => JSON.parse(text).map(judged);
`;

async function bundled(): Promise<string> {
  const { outputFiles } = await build({
    stdin: { contents: ENTRY, resolveDir: root, sourcefile: 'engine-in-a-page.ts', loader: 'ts' },
    alias: { '@': join(root, '.') },
    bundle: true,
    write: false,
    format: 'iife',
    platform: 'browser',
  });
  return outputFiles[0]?.text ?? '';
}

let browser: Browser;
let page: Page;
let source = '';

beforeAll(async () => {
  source = await bundled();
  browser = await launch();
  page = await browser.newPage();
  await page.goto('about:blank');
});
afterAll(() => browser.close());

/** Judges in the page itself, beside whatever else the page holds. */
async function inPage(): Promise<string[]> {
  await page.evaluate(source);
  return page.evaluate((text) => {
    // What the bundle has just defined in the page.
    const { judgeAll } = globalThis as unknown as { judgeAll(text: string): string[] };
    return judgeAll(text);
  }, JSON.stringify(designs));
}

async function inWorker(): Promise<string[]> {
  return page.evaluate(
    ([code, text]) =>
      new Promise<string[]>((resolve, reject) => {
        const answer = '\nonmessage = ({ data }) => postMessage(judgeAll(data));';
        const worker = new Worker(URL.createObjectURL(new Blob([code ?? '', answer], { type: 'text/javascript' })));
        worker.onmessage = ({ data }: MessageEvent<string[]>) => resolve(data);
        worker.onerror = ({ message }) => reject(new Error(message));
        worker.postMessage(text);
      }),
    [source, JSON.stringify(designs)],
  );
}

test('a design has the same verdict to the last byte in a page, in its worker and on the server', async () => {
  // The worker computes while the server does.
  const working = inWorker();
  const server = designs.map(judged);
  expect(server.length).toBe(500);
  expect(server.filter((text) => text.includes('"coilyard-verdict/1"')).length).toBeGreaterThan(400);
  expect(await working).toEqual(server);
  expect(await inPage()).toEqual(server);
});
