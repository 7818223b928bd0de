'use client';

import { useQuery } from '@tanstack/react-query';
import type { PartPage, Place } from '@/services/parts/schemas';

/** Everything the browser reads after the page: keys and fetchers in one list. The only file that calls `fetch`. */
const keys = {
  parts: (place: Place, q: string) => ['parts', place, q] as const,
};

/** Parts that may stand in a place and match what is typed. */
export function usePartSearch(place: Place, q: string) {
  return useQuery({
    queryKey: keys.parts(place, q),
    queryFn: ({ signal }) => get<PartPage>(`/api/v1/parts?${new URLSearchParams({ place, q })}`, signal),
    placeholderData: (before) => before,
    staleTime: 30_000,
  });
}

async function get<T>(path: string, signal: AbortSignal): Promise<T> {
  const response = await fetch(path, { signal, headers: { Accept: 'application/json' } });
  if (!response.ok) throw new Error(`The yard answered ${response.status}.`);
  // Our own API sends what the view schema of the same name describes.
  return (await response.json()) as T;
}
