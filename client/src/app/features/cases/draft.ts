import { effect, signal, type WritableSignal } from '@angular/core';

const keyOf = (caseId: string, field: string): string => `draft ${caseId} ${field}`;

function kept(key: string): string | undefined {
  try {
    return sessionStorage.getItem(key) ?? undefined;
  } catch {
    return undefined;
  }
}

/**
 * What is typed into a field of a case, kept in this tab until it is emptied: leaving the screen or a
 * reload loses nothing. Where the window has no store it lives as long as the screen.
 * Call it where `inject` may be called.
 */
export function draft(caseId: string, field: string, initial = ''): WritableSignal<string> {
  const key = keyOf(caseId, field);
  const text = signal(kept(key) ?? initial);
  effect(() => {
    const now = text();
    try {
      if (now === initial) sessionStorage.removeItem(key);
      else sessionStorage.setItem(key, now);
    } catch {
      // A full or closed store: the text stays on the screen.
    }
  });
  return text;
}
