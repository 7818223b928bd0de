'use client';

import { signIn } from 'next-auth/react';
import type { ActionResult } from '@/components/forms/action-result';
import { signInSentence } from '@/services/people/rules';

/** Signs in by one of the ways the server knows, and stays on the page: what was typed is kept when it does not fit. */
export async function enter(
  way: 'password' | 'link' | 'demo',
  input: Record<string, string>,
): Promise<ActionResult<null>> {
  try {
    const answer = await signIn(way, { ...input, redirect: false });
    if (answer?.ok && !answer.error) return { ok: true, value: null };
    return { ok: false, problem: { kind: 'refused', sentence: signInSentence(answer?.error ?? 'failed') } };
  } catch {
    // The line broke or the answer was no answer; signing in again is safe.
    return { ok: false, problem: { kind: 'unavailable', sentence: signInSentence('failed') } };
  }
}

/** A whole new page load: nothing of the visitor before is left in the browser's memory. */
export function loadAnew(path: string): void {
  window.location.assign(path);
}

/** After signing in: the server says where to, the page asked for or the person's own first screen. */
export function goOn(next: string | null): void {
  loadAnew(next === null ? '/sign-in' : `/sign-in?next=${encodeURIComponent(next)}`);
}
