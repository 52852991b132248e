import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import type { Refinement as RefinementBody, RefinementObstacle } from '@/schemas/generated/contract';

/** The computation of an entry to many digits: asked for, under way, or over. */
export class Refinement extends Model<InferAttributes<Refinement>, InferCreationAttributes<Refinement>> {
  declare id: CreationOptional<string>;
  declare orbitNumber: number;
  declare digits: number;
  /** Null: the archive itself. */
  declare askedBy: string | null;
  declare state: CreationOptional<RefinementBody['state']>;
  /** Computing time it may take. */
  declare seconds: number;
  declare attempts: CreationOptional<number>;
  /** The revision of the entry that has these digits. */
  declare revision: CreationOptional<number | null>;
  /** Why there are no more digits, and the same in a sentence. */
  declare reason: CreationOptional<RefinementObstacle['reason'] | null>;
  declare message: CreationOptional<string | null>;
  /** What happened where the machinery broke. */
  declare failure: CreationOptional<string | null>;
  declare engineVersion: CreationOptional<string | null>;
  declare computeMs: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare startedAt: CreationOptional<Date | null>;
  declare finishedAt: CreationOptional<Date | null>;

  static define(db: Sequelize): typeof Refinement {
    return Refinement.init(
      {
        id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
        orbitNumber: { type: DataTypes.INTEGER, allowNull: false },
        digits: { type: DataTypes.INTEGER, allowNull: false },
        askedBy: { type: DataTypes.UUID },
        state: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'queued' },
        seconds: { type: DataTypes.INTEGER, allowNull: false },
        attempts: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
        revision: { type: DataTypes.INTEGER },
        reason: { type: DataTypes.TEXT },
        message: { type: DataTypes.TEXT },
        failure: { type: DataTypes.TEXT },
        engineVersion: { type: DataTypes.TEXT },
        computeMs: { type: DataTypes.DOUBLE, allowNull: false, defaultValue: 0 },
        createdAt: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
        startedAt: { type: DataTypes.DATE },
        finishedAt: { type: DataTypes.DATE },
      },
      { sequelize: db, tableName: 'refinement', underscored: true, timestamps: false },
    );
  }
}
