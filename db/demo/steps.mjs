// What `npm run demo` and `npm test` share before anything is installed: Node's own modules only.
import { spawn, spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, readdirSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:net';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

export const root = fileURLToPath(new URL('../..', import.meta.url));

const dist = process.env.COILYARD_DIST ?? '.next';

export const say = (sentence) => console.log(`\n== ${sentence}`);

export class Stop extends Error {}

/** Runs a command to its end with its output shown; tells how long it took. */
export function run(what, command, args, options = {}) {
  say(what);
  const begun = Date.now();
  const { status } = spawnSync(command, args, { cwd: root, stdio: 'inherit', ...options });
  console.log(`   ${status === 0 ? 'done' : 'failed'} in ${Math.round((Date.now() - begun) / 1000)} s`);
  return status === 0;
}

export function checkNode() {
  const [major] = process.versions.node.split('.').map(Number);
  if (major !== 20)
    throw new Stop(`Coilyard runs on Node.js 20; this is ${process.version}. Switch, then start again.`);
}

const hashOf = (...files) => {
  const hash = createHash('sha256');
  for (const file of files) hash.update(file).update(readFileSync(join(root, file)));
  return hash.digest('hex');
};

/** Remembers what a step was done for, so that the next start skips it. */
function once(mark, key, step) {
  const file = join(root, mark);
  if (existsSync(file) && readFileSync(file, 'utf8') === key) return false;
  step();
  mkdirSync(join(file, '..'), { recursive: true });
  writeFileSync(file, key);
  return true;
}

export function install() {
  once('node_modules/.coilyard-installed', hashOf('package.json', 'package-lock.json'), () => {
    if (!run('Installing packages (the database driver is compiled: about two minutes)', 'npm', ['ci', '--no-audit'])) {
      throw new Stop(
        'The packages could not be installed. The database driver needs python3, make and g++ (Debian: apt-get install python3 make g++), and npm its registry.',
      );
    }
  });
}

function* filesUnder(folder) {
  for (const entry of readdirSync(join(root, folder), { withFileTypes: true })) {
    const path = join(folder, entry.name);
    if (entry.isDirectory()) yield* filesUnder(path);
    else yield path;
  }
}

const built = ['app', 'components', 'services', 'db', 'templates', 'public'];
const settings = [
  'next.config.mjs',
  'tailwind.config.ts',
  'postcss.config.mjs',
  'tsconfig.json',
  'package-lock.json',
  'proxy.ts',
  'instrumentation.ts',
  'instrumentation-client.ts',
];

export function build() {
  const sources = [...built.flatMap((folder) => [...filesUnder(folder)]), ...settings].sort();
  once(`${dist}/coilyard-built`, hashOf(...sources), () => {
    if (!run('Building the product (about a minute)', 'npm', ['run', '--silent', 'build'])) {
      throw new Stop('The build failed; what it said stands above.');
    }
  });
}

/** Debian's Chromium, or where CHROMIUM says it is. */
export function findChromium() {
  const path = process.env.CHROMIUM ?? '/usr/bin/chromium';
  if (!existsSync(path)) {
    throw new Stop(
      `The browser tests need Chromium, which is not at ${path}. Install it (Debian: apt-get install chromium) or name it in CHROMIUM.`,
    );
  }
  return path;
}

export const isFree = (port) =>
  new Promise((resolve) => {
    const probe = createServer();
    probe.once('error', () => resolve(false));
    probe.listen(port, '127.0.0.1', () => probe.close(() => resolve(true)));
  });

export async function freePorts(count) {
  const ports = [];
  for (let port = 20_000 + Math.floor(Math.random() * 20_000); ports.length < count; port++) {
    if (await isFree(port)) ports.push(port);
  }
  return ports;
}

/** The environment of a product that runs on stand-ins, all on this machine. */
export function demoEnvironment({ port, payPort, smtpPort, database }) {
  const url = `http://127.0.0.1:${port}`;
  return {
    ...process.env,
    NODE_ENV: 'production',
    NEXT_TELEMETRY_DISABLED: '1',
    PORT: String(port),
    HOSTNAME: '127.0.0.1',
    COILYARD_DATABASE: database,
    COILYARD_URL: url,
    NEXTAUTH_URL: url,
    NEXTAUTH_SECRET: 'for-the-demo-only-never-in-a-real-installation',
    STRIPE_SECRET_KEY: 'sk_test_demo',
    STRIPE_WEBHOOK_SECRET: 'whsec_demo',
    STRIPE_API_HOST: `127.0.0.1:${payPort}`,
    SMTP_HOST: '127.0.0.1',
    SMTP_PORT: String(smtpPort),
    MAIL_FROM: 'Coilyard <yard@coilyard.example>',
    COILYARD_DEMO: '1',
    LOG_LEVEL: process.env.LOG_LEVEL ?? 'warn',
  };
}

// tsx as a loader, not as a command: its wrapper leaves its child running when it is killed.
const tsxArgs = (script, ...args) => [process.execPath, ['--import', 'tsx', join(root, script), ...args]];

export function prepareDatabase(environment) {
  const quiet = { env: environment };
  if (!run('Bringing the database to its newest form', ...tsxArgs('services/commands/migrate.ts'), quiet)) {
    throw new Stop('The database could not be brought to its newest form; what it said stands above.');
  }
  if (!run('Filling it with the demo yard', ...tsxArgs('db/demo/seed.ts'), quiet)) {
    throw new Stop('The demo data could not be written; what it said stands above.');
  }
}

async function answers(url, child, name) {
  for (let tries = 0; tries < 300; tries++) {
    if (child.exitCode !== null)
      throw new Stop(`${name} stopped with exit code ${child.exitCode} before it was ready.`);
    try {
      await fetch(url, { redirect: 'manual' });
      return;
    } catch {
      await new Promise((resolve) => setTimeout(resolve, 100));
    }
  }
  throw new Stop(`${name} did not answer at ${url} within 30 seconds.`);
}

/**
 * Starts the payment and mail stand-ins, the worker and the built product. `stop` ends all of them.
 * `output` is where their words go: 'inherit', or a file descriptor.
 */
export async function startProduct({ environment, payPort, smtpPort, mailPort, output = 'inherit' }) {
  const children = [];
  const start = (name, command, args) => {
    const child = spawn(command, args, { cwd: root, env: environment, stdio: ['ignore', output, output] });
    children.push(child);
    child.on('exit', (code) => {
      if (!stopping && code !== 0) console.error(`${name} stopped with exit code ${code}.`);
    });
    return child;
  };
  let stopping = false;
  const stop = async () => {
    stopping = true;
    const living = children.filter((child) => child.exitCode === null && child.signalCode === null);
    const ended = living.map((child) => new Promise((resolve) => child.once('exit', resolve)));
    for (const child of living) child.kill('SIGTERM');
    const late = setTimeout(() => living.forEach((child) => child.kill('SIGKILL')), 5000);
    await Promise.all(ended);
    clearTimeout(late);
  };
  try {
    const pay = start(
      'The payment stand-in',
      ...tsxArgs(
        'test/fakes/stripe/main.ts',
        '--port',
        String(payPort),
        '--webhook',
        `${environment.COILYARD_URL}/api/stripe`,
        '--secret',
        environment.STRIPE_WEBHOOK_SECRET,
      ),
    );
    const mail = start('The mail stand-in', process.execPath, [
      join(root, 'node_modules/maildev/dist/bin/maildev.js'),
      ...[
        '--ip',
        '127.0.0.1',
        '--web-ip',
        '127.0.0.1',
        '--smtp',
        String(smtpPort),
        '--web',
        String(mailPort),
        '--silent',
      ],
    ]);
    const web = start('The product', process.execPath, [join(root, dist, 'standalone/server.js')]);
    start('The worker', ...tsxArgs('services/worker/main.ts'));
    await answers(`http://127.0.0.1:${payPort}/`, pay, 'The payment stand-in');
    await answers(`http://127.0.0.1:${mailPort}/`, mail, 'The mail stand-in');
    await answers(`${environment.COILYARD_URL}/api/v1/health`, web, 'The product');
  } catch (error) {
    await stop();
    throw error;
  }
  return { stop };
}

/** Ends a script on a fault: a sentence for what a person can mend, the whole of it for what is ours. */
export function fail(error) {
  if (error instanceof Stop) console.error(`\n${error.message}`);
  else console.error(error);
  process.exit(1);
}
