import 'server-only';
export * from './queue';
