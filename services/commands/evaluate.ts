import { readFileSync } from 'node:fs';
import { asText, evaluate, InvalidInput, Rules, type Issue } from '../receiver';

/** `npm run -s evaluate -- FILE [--seed N] [--boxes N] [--rules FILE] [--text]`; exits 0 clears, 1 stops, 2 not evaluated. */
interface Asked {
  file: string;
  seed: number | undefined;
  boxes: number | undefined;
  rules: string | undefined;
  text: boolean;
}

/** What cannot be evaluated: one sentence, and the issues of the file where there are any. */
class Refusal extends Error {
  constructor(
    sentence: string,
    readonly issues: readonly Issue[] = [],
  ) {
    super(sentence);
  }
}

const SEED = { least: 0, most: 4294967295 };
const BOXES = { least: 400, most: 200000 };

function wholeNumber(flag: string, text: string | undefined, { least, most }: { least: number; most: number }): number {
  const value = text !== undefined && /^\d{1,10}$/.test(text) ? Number(text) : NaN;
  if (value >= least && value <= most) return value;
  throw new Refusal(`Give ${flag} a whole number from ${least} to ${most}.`);
}

function asked(words: readonly string[]): Asked {
  const found: Asked = { file: '', seed: undefined, boxes: undefined, rules: undefined, text: false };
  const files: string[] = [];
  for (let i = 0; i < words.length; i += 1) {
    const word = words[i] ?? '';
    if (word === '--text') found.text = true;
    else if (word === '--seed') found.seed = wholeNumber(word, words[(i += 1)], SEED);
    else if (word === '--boxes') found.boxes = wholeNumber(word, words[(i += 1)], BOXES);
    else if (word === '--rules') {
      found.rules = words[(i += 1)];
      if (found.rules === undefined) throw new Refusal('Name the file of thresholds after --rules.');
    } else if (word.startsWith('-') && word !== '-')
      throw new Refusal(`There is no flag ${word}: --seed, --boxes, --rules and --text exist.`);
    else files.push(word);
  }
  const [file, second] = files;
  if (file === undefined) throw new Refusal('Name a design file, or - to read it from standard input.');
  if (second !== undefined) throw new Refusal('Name one design file, not several.');
  return { ...found, file };
}

function readJson(file: string, what: string): unknown {
  let text: string;
  try {
    text = readFileSync(file === '-' ? 0 : file, 'utf8');
  } catch {
    throw new Refusal(`The ${what} ${file} cannot be read: check its name.`);
  }
  try {
    return JSON.parse(text);
  } catch {
    throw new Refusal(`The ${what} ${file} is no JSON: check it in an editor.`);
  }
}

function readRules(file: string): Rules {
  const parsed = Rules.safeParse(readJson(file, 'file of thresholds'));
  if (parsed.success) return parsed.data;
  const issues = parsed.error.issues.map(({ path, message }) => ({ path: path.map(String).join('.'), message }));
  throw new Refusal('The file of thresholds cannot be used.', issues);
}

function main(words: readonly string[]): number {
  try {
    const { file, seed, boxes, rules, text } = asked(words);
    const design = readJson(file, 'design file');
    const thresholds = rules === undefined ? undefined : readRules(rules);
    const verdict = evaluate(design, { seed, boxes, rules: thresholds });
    process.stdout.write(text ? asText(verdict) : `${JSON.stringify(verdict)}\n`);
    return verdict.outcome === 'stops' ? 1 : 0;
  } catch (error) {
    if (!(error instanceof Refusal || error instanceof InvalidInput)) throw error;
    const sentence = error instanceof InvalidInput ? 'The design cannot be evaluated.' : error.message;
    process.stderr.write(`${JSON.stringify({ error: sentence, issues: error.issues })}\n`);
    return 2;
  }
}

process.exitCode = main(process.argv.slice(2));
