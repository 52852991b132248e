import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from 'sequelize';

/** A crossing of an entry's current revision. `place` is a `cube` literal: the point in units of the system's extents. */
export class Crossing extends Model<InferAttributes<Crossing>, InferCreationAttributes<Crossing>> {
  declare systemId: string;
  declare orbitNumber: number;
  declare position: number;
  declare time: number;
  declare point: number[];
  declare transversality: number;
  declare place: string;

  static define(db: Sequelize): typeof Crossing {
    return Crossing.init(
      {
        systemId: { type: DataTypes.UUID, primaryKey: true },
        orbitNumber: { type: DataTypes.INTEGER, primaryKey: true },
        position: { type: DataTypes.INTEGER, primaryKey: true },
        time: { type: DataTypes.DOUBLE, allowNull: false },
        point: { type: DataTypes.ARRAY(DataTypes.DOUBLE), allowNull: false },
        transversality: { type: DataTypes.DOUBLE, allowNull: false },
        place: { type: DataTypes.TEXT, allowNull: false },
      },
      { sequelize: db, tableName: 'crossing', underscored: true, timestamps: false },
    );
  }
}
