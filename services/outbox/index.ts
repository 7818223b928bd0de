import 'server-only';
export * from './queue';
export * from './claim';
