import type { z } from 'zod';
import type { World } from '../world';
import type { FormTree } from './form';
import { readParameters } from './parameters';

type Work = (world: World, id: string) => object;

export interface Route {
  method: 'GET' | 'POST';
  /** `:id` stands for one part of the path. */
  path: string;
  /** Reads the parameters or refuses them; the work itself comes after. */
  prepare: (tree: FormTree) => Work;
}

export function route<S extends z.ZodType>(
  method: Route['method'],
  path: string,
  schema: S,
  run: (world: World, input: z.output<S>, id: string) => object,
): Route {
  return {
    method,
    path,
    prepare: (tree) => {
      const input = readParameters(schema, tree);
      return (world, id) => run(world, input, id);
    },
  };
}

export function matches(route: Route, method: string, path: string): { id: string } | undefined {
  const pattern = route.path.split('/');
  const parts = path.split('/');
  if (route.method !== method || pattern.length !== parts.length) return undefined;
  if (!pattern.every((part, index) => part === ':id' || part === parts[index])) return undefined;
  return { id: decodeURIComponent(parts[pattern.indexOf(':id')] ?? '') };
}
