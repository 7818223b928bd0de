import 'server-only';
export * from './write';
export * from './canonical';
