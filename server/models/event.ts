import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import type { ReasonCode, ReviewState } from '@/schemas/generated/contract';

/** What can happen to a submission. */
export type EventKind =
  | 'created'
  | 'edited'
  | 'sent'
  | 'checked'
  | 'check-failed'
  | 'recheck-asked'
  | 'pulled-back'
  | 'claimed'
  | 'taken-over'
  | 'released'
  | 'claim-expired'
  | 'commented'
  | 'accepted'
  | 'returned'
  | 'declined'
  | 'withdrawn';

/** One line of a submission's history; the database lets nobody rewrite it. */
export class Event extends Model<InferAttributes<Event>, InferCreationAttributes<Event>> {
  declare id: CreationOptional<number>;
  declare submissionId: string;
  declare kind: EventKind;
  /** Null: the machine. */
  declare actorId: string | null;
  declare fromState: ReviewState | null;
  declare toState: ReviewState | null;
  declare revision: number;
  declare checkId: string | null;
  declare reason: ReasonCode | null;
  declare comment: string | null;
  /** `Submission.changes` once it had happened. */
  declare change: number;
  declare at: CreationOptional<Date>;

  static define(db: Sequelize): typeof Event {
    return Event.init(
      {
        id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true, autoIncrementIdentity: true },
        submissionId: { type: DataTypes.UUID, allowNull: false },
        kind: { type: DataTypes.TEXT, allowNull: false },
        actorId: { type: DataTypes.UUID },
        fromState: { type: DataTypes.TEXT },
        toState: { type: DataTypes.TEXT },
        revision: { type: DataTypes.INTEGER, allowNull: false },
        checkId: { type: DataTypes.TEXT },
        reason: { type: DataTypes.TEXT },
        comment: { type: DataTypes.TEXT },
        change: { type: DataTypes.INTEGER, allowNull: false },
        at: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
      },
      { sequelize: db, tableName: 'event', underscored: true, timestamps: false },
    );
  }
}
