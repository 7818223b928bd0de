import { defineConfig, globalIgnores } from 'eslint/config';
import vitals from 'eslint-config-next/core-web-vitals';
import typescript from 'eslint-config-next/typescript';

const zone = (target, from, message, except) => ({ target, from, message, ...(except && { except }) });
const deeds = ['./services/!(receiver)/!(schemas|rules|cautions|actor|can).ts', './services/!(receiver)/*/**/*'];
const zones = [
  zone('./db/!(demo)/**/*', ['./app', './components', './services', './templates'], 'db is the lowest layer'),
  zone('./db/*.ts', ['./app', './components', './services', './templates'], 'db is the lowest layer'),
  zone('./services/receiver', ['./app', './components', './templates', './db'], 'the engine is pure'),
  zone('./services/receiver', './services', 'the engine is pure', ['./receiver']),
  zone('./services', ['./app', './components'], 'services know no screens'),
  zone('./services/!(documents|worker)/**/*', './templates', 'only documents and worker print'),
  zone('./components', ['./app', './db'], 'actions and data come as props'),
  zone('./components', deeds, 'schemas, rules and the engine only'),
  zone('./components', './templates', 'drawings only', ['./drawings']),
  zone('./templates', ['./app', './components', './db'], 'templates draw'),
  zone('./templates', deeds, 'templates draw a view'),
  zone('./app', ['./db', './templates'], 'through services'),
];

const inexact = [
  'exp',
  'expm1',
  'log',
  'log2',
  'log10',
  'log1p',
  'sin',
  'cos',
  'tan',
  'asin',
  'acos',
  'atan',
  'atan2',
  'sinh',
  'cosh',
  'tanh',
  'asinh',
  'acosh',
  'atanh',
  'pow',
  'cbrt',
  'hypot',
  'random',
];
const message = 'engines differ in its last digits: use services/receiver/numeric';
const outside = ['Date', 'process', 'window', 'document', 'fetch', 'crypto', 'performance', 'setTimeout'];

const noFreeTransaction = {
  selector: "CallExpression[callee.property.name='transaction']",
  message: 'Write through `write` of services/record: it takes the lock at the start and tries again when busy.',
};

export default defineConfig([
  ...vitals,
  ...typescript,
  globalIgnores(['.next/**', '.next-*/**', 'node_modules/**', 'next-env.d.ts', 'test/artefacts/**', 'data/**']),
  {
    rules: {
      'import/no-cycle': 'error',
      'import/no-restricted-paths': ['error', { basePath: import.meta.dirname, zones }],
      'no-restricted-syntax': ['error', noFreeTransaction],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
    },
  },
  {
    files: ['services/receiver/**/*.ts'],
    rules: {
      'no-restricted-properties': ['error', ...inexact.map((property) => ({ object: 'Math', property, message }))],
      'no-restricted-globals': ['error', ...outside.map((name) => ({ name, message: 'the engine is pure' }))],
      'no-restricted-imports': [
        'error',
        { patterns: [{ regex: '^(?!\\.{1,2}/|zod$)', message: 'the engine imports itself and zod only' }] },
      ],
      'no-restricted-syntax': ['error', { selector: "BinaryExpression[operator='**']", message }],
    },
  },
  { files: ['services/record/**', 'test/**'], rules: { 'no-restricted-syntax': 'off' } },
]);
