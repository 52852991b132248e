import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import type { Check, CheckRequest } from '@/schemas/generated/contract';

export type OrbitCheckState = 'queued' | 'running' | 'done' | 'failed';

/** A check that somebody asked for. Who holds the id of a private one may read it. */
export class OrbitCheck extends Model<InferAttributes<OrbitCheck>, InferCreationAttributes<OrbitCheck>> {
  declare id: string;
  declare body: CheckRequest;
  /** Null: the body holds a whole system document. */
  declare systemId: string | null;
  declare systemVersion: number | null;
  declare ownerId: string | null;
  declare addressHash: string | null;
  declare submissionId: CreationOptional<string | null>;
  declare revision: CreationOptional<number | null>;
  declare state: CreationOptional<OrbitCheckState>;
  /** Computing time it may take. */
  declare seconds: number;
  declare progress: CreationOptional<Check['progress']>;
  declare attempts: CreationOptional<number>;
  declare failure: CreationOptional<string | null>;
  declare engineVersion: CreationOptional<string | null>;
  declare computeMs: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare startedAt: CreationOptional<Date | null>;
  declare finishedAt: CreationOptional<Date | null>;

  static define(db: Sequelize): typeof OrbitCheck {
    return OrbitCheck.init(
      {
        id: { type: DataTypes.TEXT, primaryKey: true },
        body: { type: DataTypes.JSON, allowNull: false },
        systemId: { type: DataTypes.UUID },
        systemVersion: { type: DataTypes.INTEGER },
        ownerId: { type: DataTypes.UUID },
        addressHash: { type: DataTypes.TEXT },
        submissionId: { type: DataTypes.UUID },
        revision: { type: DataTypes.INTEGER },
        state: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'queued' },
        seconds: { type: DataTypes.INTEGER, allowNull: false },
        progress: { type: DataTypes.JSON },
        attempts: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
        failure: { type: DataTypes.TEXT },
        engineVersion: { type: DataTypes.TEXT },
        computeMs: { type: DataTypes.DOUBLE, allowNull: false, defaultValue: 0 },
        createdAt: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
        startedAt: { type: DataTypes.DATE },
        finishedAt: { type: DataTypes.DATE },
      },
      { sequelize: db, tableName: 'orbit_check', underscored: true, timestamps: false },
    );
  }
}
