import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import type { Entry } from '@/schemas/generated/contract';

/** What a revision of an entry says about the orbit, as the API shows it; the columns of `orbit` are not repeated. */
export type EntryContent = Pick<
  Entry,
  | 'point'
  | 'period'
  | 'returnTimes'
  | 'crossings'
  | 'multipliers'
  | 'unitMultipliers'
  | 'exponents'
  | 'unstableDirections'
  | 'smallestTransversality'
  | 'extent'
  | 'invariants'
  | 'closure'
  | 'correction'
  | 'verdict'
  | 'findings'
  | 'submitted'
  | 'note'
> & {
  /** Version of the computation. */
  engine: string;
};

/** One revision of an entry; the database keeps it from ever changing. */
export class OrbitRevision extends Model<InferAttributes<OrbitRevision>, InferCreationAttributes<OrbitRevision>> {
  declare orbitNumber: number;
  declare revision: number;
  declare content: EntryContent;
  declare checkId: string;
  declare madeBy: string | null;
  declare why: string;
  declare at: CreationOptional<Date>;

  static define(db: Sequelize): typeof OrbitRevision {
    return OrbitRevision.init(
      {
        orbitNumber: { type: DataTypes.INTEGER, primaryKey: true },
        revision: { type: DataTypes.INTEGER, primaryKey: true },
        content: { type: DataTypes.JSON, allowNull: false },
        checkId: { type: DataTypes.TEXT, allowNull: false },
        madeBy: { type: DataTypes.UUID },
        why: { type: DataTypes.TEXT, allowNull: false },
        at: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
      },
      { sequelize: db, tableName: 'orbit_revision', underscored: true, timestamps: false },
    );
  }
}
