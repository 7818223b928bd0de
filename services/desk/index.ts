import 'server-only';
export { readToday } from './views';
