import { noSuch } from '../errors';

export function held<T>(shelf: Map<string, T>, kind: string, id: string): T {
  const found = shelf.get(id);
  if (!found) throw noSuch(kind, id);
  return found;
}
