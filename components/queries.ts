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

/** All parts of one place: a short list, since a place takes a kind or two. */
export async function fetchPartsAt(place: Place): Promise<PartPage['parts']> {
  const parts: PartPage['parts'] = [];
  let after: string | null = '';
  while (after !== null) {
    const query = new URLSearchParams({ place, ...(after !== '' && { after }) });
    const page: PartPage = await get<PartPage>(`/api/v1/parts?${query}`, AbortSignal.timeout(10_000));
    parts.push(...page.parts);
    after = page.next;
  }
  return parts;
}

async function get<T>(path: string, signal: AbortSignal): Promise<T> {
  const response = await fetch(path, { signal, headers: { Accept: 'application/json' } });
  if (!response.ok) throw new Error(`The yard answered ${response.status}.`);
  // Our own API sends what the view schema of the same name describes.
  return (await response.json()) as T;
}
