import { useEffect, useState } from 'react';
import type { default as Fuse } from 'fuse.js';

export type FuseClass = typeof Fuse;

/** Fuzzy search, fetched when it is first needed; null until it is there, and for good where it does not come. */
export function useFuse(isNeeded: boolean): FuseClass | null {
  const [fuse, setFuse] = useState<{ Class: FuseClass } | null>(null);
  useEffect(() => {
    if (!isNeeded) return undefined;
    let isWanted = true;
    import('fuse.js').then(
      (module) => {
        if (isWanted) setFuse({ Class: module.default });
      },
      () => undefined,
    );
    return () => {
      isWanted = false;
    };
  }, [isNeeded]);
  return fuse?.Class ?? null;
}
