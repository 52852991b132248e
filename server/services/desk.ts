import type { Sequelize } from 'sequelize';
import type { ReasonCode } from '@/schemas/generated/contract';
import type { EventKind } from '@/server/models/event';
import type { Submission } from '@/server/models/submission';

/** Where the desk's services work. */
export interface Desk {
  db: Sequelize;
  /** Address that links in mails begin with. */
  publicUrl: string;
}

/** One thing that happens to a submission. */
export interface Change {
  kind: EventKind;
  /** Who did it; null: the machine. */
  actorId: string | null;
  checkId?: string;
  reason?: ReasonCode;
  comment?: string;
  /** Columns that change with it. */
  set?: Partial<
    Pick<
      Submission,
      | 'revision'
      | 'claimedBy'
      | 'claimedUntil'
      | 'decision'
      | 'decidedBy'
      | 'decidedAt'
      | 'reason'
      | 'decisionComment'
      | 'entryNumber'
      | 'sentAt'
    >
  >;
}
