import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';

/** A section that entries lie on: a named one of its system, or an inline one without a name. */
export class Section extends Model<InferAttributes<Section>, InferCreationAttributes<Section>> {
  declare id: CreationOptional<string>;
  declare systemId: string;
  declare name: string | null;
  declare formula: string;

  static define(db: Sequelize): typeof Section {
    return Section.init(
      {
        id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
        systemId: { type: DataTypes.UUID, allowNull: false },
        name: { type: DataTypes.TEXT },
        formula: { type: DataTypes.TEXT, allowNull: false },
      },
      { sequelize: db, tableName: 'section', underscored: true, timestamps: false },
    );
  }
}
