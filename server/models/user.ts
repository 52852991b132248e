import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
  type Transaction,
} from 'sequelize';
import type { Role } from '@/schemas/generated/contract';

/** An account. */
export class User extends Model<InferAttributes<User>, InferCreationAttributes<User>> {
  declare id: CreationOptional<string>;
  declare name: string;
  /** In small letters. */
  declare email: string;
  declare orcid: string | null;
  declare role: CreationOptional<Role>;
  declare passwordHash: string;
  declare confirmedAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  /** Wants the daily mail about new submissions; curators only get it. */
  declare digest: CreationOptional<boolean>;
  declare digestSentAt: CreationOptional<Date | null>;

  static define(db: Sequelize): typeof User {
    return User.init(
      {
        id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
        name: { type: DataTypes.TEXT, allowNull: false },
        email: { type: DataTypes.TEXT, allowNull: false },
        orcid: { type: DataTypes.TEXT },
        role: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'reader' },
        passwordHash: { type: DataTypes.TEXT, allowNull: false },
        confirmedAt: { type: DataTypes.DATE },
        createdAt: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
        digest: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: true },
        digestSentAt: { type: DataTypes.DATE },
      },
      { sequelize: db, tableName: 'account', underscored: true, timestamps: false },
    );
  }

  /** The account of an address, however it is typed. */
  static byEmail(typed: string, transaction?: Transaction): Promise<User | null> {
    return User.findOne({ where: { email: typed.trim().toLowerCase() }, transaction: transaction ?? null });
  }
}
