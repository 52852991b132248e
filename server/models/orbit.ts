import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import type { Entry, RefinementObstacle, Stability } from '@/schemas/generated/contract';

/** An entry of the catalogue: the columns that searches use. Its figures are in its revisions. */
export class Orbit extends Model<InferAttributes<Orbit>, InferCreationAttributes<Orbit>> {
  /** The accession's number; from a sequence, never used twice. */
  declare number: number;
  declare accession: string;
  declare systemId: string;
  declare systemVersion: number;
  declare sectionId: string;
  declare revision: CreationOptional<number>;
  declare status: CreationOptional<Entry['status']>;
  /** All of them, as typed or as the system has them, in its order. */
  declare parameters: Record<string, string>;
  /** The same as doubles. */
  declare parameterValues: Record<string, number>;
  /** Equal for orbits of the very same flow. */
  declare parametersHash: string;
  declare period: number;
  /** Every digit. */
  declare periodDigits: string;
  declare returns: number;
  declare stability: Stability;
  declare unstableDirections: number;
  /** Modulus of the largest multiplier. */
  declare unstableMultiplier: number;
  declare itinerary: string | null;
  declare evidence: CreationOptional<Entry['evidence']['level']>;
  declare digits: number;
  /** Why the last refinement gave no more digits. */
  declare obstacle: CreationOptional<RefinementObstacle | null>;
  /** In small letters. */
  declare searchText: string;
  /** `[time, value]` pairs of the coordinate that the section's staff shows. */
  declare incipit: number[][];
  declare submissionId: string;
  declare contributorId: string;
  declare curatorId: string;
  declare submittedAt: Date;
  declare acceptedAt: CreationOptional<Date>;
  declare withdrawnAt: CreationOptional<Date | null>;
  declare withdrawalReason: CreationOptional<string | null>;
  /** Number of the entry that stands in for a withdrawn one. */
  declare replacement: CreationOptional<number | null>;

  static define(db: Sequelize): typeof Orbit {
    return Orbit.init(
      {
        number: { type: DataTypes.INTEGER, primaryKey: true },
        accession: { type: DataTypes.TEXT, allowNull: false },
        systemId: { type: DataTypes.UUID, allowNull: false },
        systemVersion: { type: DataTypes.INTEGER, allowNull: false },
        sectionId: { type: DataTypes.UUID, allowNull: false },
        revision: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 1 },
        status: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'accepted' },
        parameters: { type: DataTypes.JSON, allowNull: false },
        parameterValues: { type: DataTypes.JSONB, allowNull: false },
        parametersHash: { type: DataTypes.TEXT, allowNull: false },
        period: { type: DataTypes.DOUBLE, allowNull: false },
        periodDigits: { type: DataTypes.DECIMAL, allowNull: false },
        returns: { type: DataTypes.INTEGER, allowNull: false },
        stability: { type: DataTypes.TEXT, allowNull: false },
        unstableDirections: { type: DataTypes.INTEGER, allowNull: false },
        unstableMultiplier: { type: DataTypes.DOUBLE, allowNull: false },
        itinerary: { type: DataTypes.TEXT },
        evidence: { type: DataTypes.TEXT, allowNull: false, defaultValue: 're-integrated' },
        digits: { type: DataTypes.INTEGER, allowNull: false },
        obstacle: { type: DataTypes.JSON },
        searchText: { type: DataTypes.TEXT, allowNull: false },
        incipit: { type: DataTypes.JSON, allowNull: false },
        submissionId: { type: DataTypes.UUID, allowNull: false },
        contributorId: { type: DataTypes.UUID, allowNull: false },
        curatorId: { type: DataTypes.UUID, allowNull: false },
        submittedAt: { type: DataTypes.DATE, allowNull: false },
        // The database's own clock: acceptances are compared with the beginnings of checks.
        acceptedAt: { type: DataTypes.DATE },
        withdrawnAt: { type: DataTypes.DATE },
        withdrawalReason: { type: DataTypes.TEXT },
        replacement: { type: DataTypes.INTEGER },
      },
      { sequelize: db, tableName: 'orbit', underscored: true, timestamps: false },
    );
  }
}
