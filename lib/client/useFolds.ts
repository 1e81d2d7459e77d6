"use client";
import { useSyncExternalStore } from "react";

export interface Folds { readonly margin: boolean; readonly drawer: boolean }
const KEY = "ferrule-folds";
const listeners = new Set<() => void>();
let cached: { raw: string | null; folds: Folds } | null = null;

/** Below this width the drawer starts closed. */
const WIDE = 1400;
function read(): Folds {
  let raw: string | null = null;
  try { raw = localStorage.getItem(KEY); } catch { /* A browser without storage keeps the defaults. */ }
  if (cached && cached.raw === raw) return cached.folds;
  let folds: Folds = { margin: false, drawer: window.innerWidth < WIDE };
  try {
    const kept = raw ? (JSON.parse(raw) as Partial<Folds>) : {};
    folds = { margin: kept.margin ?? folds.margin, drawer: kept.drawer ?? folds.drawer };
  } catch { /* Something else wrote there: the defaults hold. */ }
  cached = { raw, folds };
  return folds;
}
const SERVER: Folds = { margin: false, drawer: true };

/** Which parts of the desk are folded away; remembered on this device. */
export function useFolds(): [Folds, (part: Partial<Folds>) => void] {
  const folds = useSyncExternalStore((listener) => { listeners.add(listener); return () => listeners.delete(listener); }, read, () => SERVER);
  const set = (part: Partial<Folds>): void => {
    const next = { ...read(), ...part };
    try { localStorage.setItem(KEY, JSON.stringify(next)); } catch { cached = { raw: null, folds: next }; }
    for (const listener of listeners) listener();
  };
  return [folds, set];
}
