import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';

/** A published source of an entry's revision. */
export class Reference extends Model<InferAttributes<Reference>, InferCreationAttributes<Reference>> {
  declare orbitNumber: number;
  declare revision: number;
  declare position: number;
  declare citation: string;
  declare doi: CreationOptional<string | null>;

  static define(db: Sequelize): typeof Reference {
    return Reference.init(
      {
        orbitNumber: { type: DataTypes.INTEGER, primaryKey: true },
        revision: { type: DataTypes.INTEGER, primaryKey: true },
        position: { type: DataTypes.INTEGER, primaryKey: true },
        citation: { type: DataTypes.TEXT, allowNull: false },
        doi: { type: DataTypes.TEXT },
      },
      { sequelize: db, tableName: 'reference', underscored: true, timestamps: false },
    );
  }
}
