import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import type { SystemDocument } from '@/schemas/generated/contract';

/** One version of a system; the database keeps its document from ever changing. */
export class SystemVersion extends Model<InferAttributes<SystemVersion>, InferCreationAttributes<SystemVersion>> {
  declare systemId: string;
  declare version: number;
  declare document: SystemDocument;
  declare state: CreationOptional<'proposed' | 'accepted' | 'declined'>;
  declare acceptedAt: CreationOptional<Date>;
  /** Null: it comes with the archive. */
  declare acceptedBy: CreationOptional<string | null>;

  static define(db: Sequelize): typeof SystemVersion {
    return SystemVersion.init(
      {
        systemId: { type: DataTypes.UUID, primaryKey: true },
        version: { type: DataTypes.INTEGER, primaryKey: true },
        document: { type: DataTypes.JSON, allowNull: false },
        state: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'accepted' },
        acceptedAt: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
        acceptedBy: { type: DataTypes.UUID },
      },
      { sequelize: db, tableName: 'system_version', underscored: true, timestamps: false },
    );
  }
}
