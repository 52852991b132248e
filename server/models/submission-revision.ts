import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import type { DraftBody } from '@/schemas/generated/contract';

/** What was typed, in one revision of a submission; unchanged once it was sent. */
export class SubmissionRevision extends Model<
  InferAttributes<SubmissionRevision>,
  InferCreationAttributes<SubmissionRevision>
> {
  declare submissionId: string;
  declare revision: number;
  declare body: DraftBody;
  /** The system as it was when this was sent. */
  declare systemId: CreationOptional<string | null>;
  declare systemVersion: CreationOptional<number | null>;
  declare createdAt: CreationOptional<Date>;
  declare sentAt: CreationOptional<Date | null>;

  static define(db: Sequelize): typeof SubmissionRevision {
    return SubmissionRevision.init(
      {
        submissionId: { type: DataTypes.UUID, primaryKey: true },
        revision: { type: DataTypes.INTEGER, primaryKey: true },
        body: { type: DataTypes.JSON, allowNull: false },
        systemId: { type: DataTypes.UUID },
        systemVersion: { type: DataTypes.INTEGER },
        createdAt: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
        sentAt: { type: DataTypes.DATE },
      },
      { sequelize: db, tableName: 'submission_revision', underscored: true, timestamps: false },
    );
  }
}
