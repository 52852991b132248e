import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import type { CheckReport as Report, Verdict } from '@/schemas/generated/contract';

/** The immutable result of a check. */
export class CheckReport extends Model<InferAttributes<CheckReport>, InferCreationAttributes<CheckReport>> {
  declare checkId: string;
  declare report: Report;
  declare verdict: Verdict;
  /** Whether it holds a blocker. */
  declare blocked: boolean;
  declare engineVersion: string;
  declare createdAt: CreationOptional<Date>;

  static define(db: Sequelize): typeof CheckReport {
    return CheckReport.init(
      {
        checkId: { type: DataTypes.TEXT, primaryKey: true },
        report: { type: DataTypes.JSON, allowNull: false },
        verdict: { type: DataTypes.TEXT, allowNull: false },
        blocked: { type: DataTypes.BOOLEAN, allowNull: false },
        engineVersion: { type: DataTypes.TEXT, allowNull: false },
        createdAt: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
      },
      { sequelize: db, tableName: 'check_report', underscored: true, timestamps: false },
    );
  }
}
