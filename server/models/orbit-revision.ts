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
  /** How the many digits were found; left out where there are no more than doubles hold. */
  refinement?: {
    /** What was held where the orbit belongs to a family; null for an isolated one. */
    held: string | null;
    /** Largest miss of a segment, a decimal, in sizes of the orbit's extents; null where the check found the digits. */
    residual: string | null;
  };
};

/** One revision of an entry; the database keeps it from ever changing. */
export class OrbitRevision extends Model<InferAttributes<OrbitRevision>, InferCreationAttributes<OrbitRevision>> {
  declare orbitNumber: number;
  declare revision: number;
  declare content: EntryContent;
  declare checkId: string;
  declare madeBy: string | null;
  declare why: string;
  /** How its figures are known. */
  declare evidence: Entry['evidence']['level'];
  declare digits: number;
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
        evidence: { type: DataTypes.TEXT, allowNull: false },
        digits: { type: DataTypes.INTEGER, allowNull: false },
        at: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
      },
      { sequelize: db, tableName: 'orbit_revision', underscored: true, timestamps: false },
    );
  }
}
