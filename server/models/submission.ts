import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import type { Decision, ReasonCode, ReviewState } from '@/schemas/generated/contract';

/** One offered orbit and where people stand with it; what was typed is in its revisions. */
export class Submission extends Model<InferAttributes<Submission>, InferCreationAttributes<Submission>> {
  declare id: CreationOptional<string>;
  /** Shown to people. */
  declare number: CreationOptional<number>;
  declare ownerId: string;
  declare reviewState: CreationOptional<ReviewState>;
  declare revision: CreationOptional<number>;
  declare claimedBy: CreationOptional<string | null>;
  declare claimedUntil: CreationOptional<Date | null>;
  declare decision: CreationOptional<Decision['decision'] | null>;
  declare decidedBy: CreationOptional<string | null>;
  declare decidedAt: CreationOptional<Date | null>;
  declare reason: CreationOptional<ReasonCode | null>;
  declare decisionComment: CreationOptional<string | null>;
  declare entryNumber: CreationOptional<number | null>;
  /** Counts what the ETag tells apart. */
  declare changes: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare sentAt: CreationOptional<Date | null>;
  declare updatedAt: CreationOptional<Date>;

  static define(db: Sequelize): typeof Submission {
    return Submission.init(
      {
        id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
        number: { type: DataTypes.INTEGER, autoIncrement: true, autoIncrementIdentity: true },
        ownerId: { type: DataTypes.UUID, allowNull: false },
        reviewState: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'draft' },
        revision: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 1 },
        claimedBy: { type: DataTypes.UUID },
        claimedUntil: { type: DataTypes.DATE },
        decision: { type: DataTypes.TEXT },
        decidedBy: { type: DataTypes.UUID },
        decidedAt: { type: DataTypes.DATE },
        reason: { type: DataTypes.TEXT },
        decisionComment: { type: DataTypes.TEXT },
        entryNumber: { type: DataTypes.INTEGER },
        changes: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
        createdAt: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
        sentAt: { type: DataTypes.DATE },
        updatedAt: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
      },
      { sequelize: db, tableName: 'submission', underscored: true, timestamps: false },
    );
  }
}
