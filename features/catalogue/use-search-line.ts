import { useCallback, useEffect, useMemo, useRef, useState } from 'react';
import { useSystems } from '@/features/api/systems';
import type { SearchTerm } from '@/features/catalogue/search-term';
import { useSearchParser } from '@/features/catalogue/use-search-parser';
import type { System } from '@/schemas/generated/contract';

/** The search goes out when nobody has typed for so long. */
const REST_MS = 350;
const NONE: System[] = [];

export interface SearchLine {
  /** The line as it stands in the field. */
  text: string;
  setText: (text: string) => void;
  /** Search now, without waiting for a rest. */
  commit: () => void;
  /** What the line in the field is understood as. */
  terms: SearchTerm[];
  /** What the address asks for: the search that is shown. */
  asked: SearchTerm[];
  systems: System[];
  /** The systems are known, or asking for them failed; before that nothing can be understood. */
  isReady: boolean;
}

/** The search line: typed here, kept in the address, understood with the systems that there are. */
export function useSearchLine(address: string, onSearch: (text: string) => void): SearchLine {
  const list = useSystems();
  const systems = list.data ?? NONE;
  const [text, setTyped] = useState(address);
  const parse = useSearchParser(systems, text, address);
  const sent = useRef(address);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);

  useEffect(() => {
    if (address === sent.current) return;
    sent.current = address;
    setTyped(address);
  }, [address]);
  useEffect(() => () => clearTimeout(timer.current), []);

  const send = useCallback(
    (next: string) => {
      clearTimeout(timer.current);
      const trimmed = next.trim();
      if (trimmed === sent.current) return;
      sent.current = trimmed;
      onSearch(trimmed);
    },
    [onSearch],
  );
  const setText = useCallback(
    (next: string) => {
      setTyped(next);
      clearTimeout(timer.current);
      timer.current = setTimeout(() => send(next), REST_MS);
    },
    [send],
  );
  return {
    text,
    setText,
    commit: () => send(text),
    terms: useMemo(() => parse(text), [parse, text]),
    asked: useMemo(() => parse(address), [parse, address]),
    systems,
    isReady: !list.isPending,
  };
}
