import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';

/** A system by its slug; what it says is in its versions. */
export class System extends Model<InferAttributes<System>, InferCreationAttributes<System>> {
  declare id: CreationOptional<string>;
  declare slug: string;
  declare currentVersion: CreationOptional<number>;
  /** Unit of each coordinate in `crossing.place`; null before the first entry. */
  declare extents: CreationOptional<number[] | null>;
  /** Place in the list. */
  declare position: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;

  static define(db: Sequelize): typeof System {
    return System.init(
      {
        id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
        slug: { type: DataTypes.TEXT, allowNull: false },
        currentVersion: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 1 },
        extents: { type: DataTypes.ARRAY(DataTypes.DOUBLE) },
        position: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
        createdAt: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
      },
      { sequelize: db, tableName: 'system', underscored: true, timestamps: false },
    );
  }
}
