import { createContext, useContext } from 'react';
import type { Decision } from '@/schemas/generated/contract';

/** A decision that was recorded, told on the page that comes next. */
export interface Recorded {
  number: number;
  decision: Decision['decision'];
  accession: string | null;
  /** Id of the submission on whose page it is told. */
  toldOn: string;
}

interface Desk {
  recorded: Recorded | null;
  setRecorded: (recorded: Recorded | null) => void;
  /** One came to this page from another of the Desk: its heading takes the focus. */
  hasMoved: () => boolean;
}

/** What the pages of the Desk tell each other; alone, a page tells nothing. */
export const DeskContext = createContext<Desk>({
  recorded: null,
  setRecorded: () => undefined,
  hasMoved: () => false,
});

export const useDesk = (): Desk => useContext(DeskContext);
