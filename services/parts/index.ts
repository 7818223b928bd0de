import 'server-only';
export { addPart } from './add-part';
export { changePart, retirePart } from './change-part';
export { type PartUse, listParts, readPart, readUse } from './views';
