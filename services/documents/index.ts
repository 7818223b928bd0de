import 'server-only';
export { readGuidePage } from './guide-page';
export { type PrintedPaper, renderPaper } from './render-paper';
