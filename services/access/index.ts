export * from './actor';
export * from './can';
