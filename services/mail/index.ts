import 'server-only';
export * from './kinds';
export * from './queue';
