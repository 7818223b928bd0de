export type FormTree = string | FormTree[] | { [key: string]: FormTree };

/** The SDK writes nested parameters as `line_items[0][price_data][currency]=eur`. */
export function decodeForm(encoded: string): FormTree {
  const root: { [key: string]: FormTree } = Object.create(null);
  for (const [key, value] of new URLSearchParams(encoded)) place(root, pathOf(key), value);
  return withLists(root);
}

function pathOf(key: string): string[] {
  const [head = '', ...rest] = key.split('[');
  return [head, ...rest.map((part) => part.replace(/\]$/, ''))];
}

export function nameOf(path: readonly PropertyKey[]): string {
  const [head = '', ...rest] = path.map(String);
  return head + rest.map((part) => `[${part}]`).join('');
}

function place(branch: { [key: string]: FormTree }, [first = '', ...rest]: string[], value: string): void {
  const key = first === '' ? String(Object.keys(branch).length) : first;
  if (rest.length === 0) {
    branch[key] = value;
    return;
  }
  const held = branch[key];
  const next: { [key: string]: FormTree } =
    held !== undefined && typeof held !== 'string' && !Array.isArray(held) ? held : Object.create(null);
  branch[key] = next;
  place(next, rest, value);
}

function withLists(tree: FormTree): FormTree {
  if (typeof tree === 'string') return tree;
  const entries = Object.entries(tree).map(([key, branch]): [string, FormTree] => [key, withLists(branch)]);
  const isList = entries.length > 0 && entries.every(([key], index) => key === String(index));
  return isList ? entries.map(([, branch]) => branch) : Object.fromEntries(entries);
}

/** The tree is the same whatever order the parameters come in. */
export function fingerprint(tree: FormTree): string {
  if (typeof tree === 'string') return JSON.stringify(tree);
  if (Array.isArray(tree)) return `[${tree.map(fingerprint).join()}]`;
  const keys = Object.keys(tree).sort();
  return `{${keys.map((key) => `${JSON.stringify(key)}:${fingerprint(tree[key] ?? '')}`).join()}}`;
}
