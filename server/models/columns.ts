import { DataTypes } from 'sequelize';

/** Column shorthands; what must hold is said by the migrations' constraints, not here. */
export const columns = {
  id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
  teamId: { type: DataTypes.UUID, allowNull: false },
  uuid: { type: DataTypes.UUID, allowNull: false },
  uuidOrNull: { type: DataTypes.UUID },
  text: { type: DataTypes.TEXT, allowNull: false },
  textOrNull: { type: DataTypes.TEXT },
  emptyText: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
  texts: { type: DataTypes.ARRAY(DataTypes.TEXT), allowNull: false, defaultValue: [] },
  int: { type: DataTypes.INTEGER, allowNull: false },
  intOrNull: { type: DataTypes.INTEGER },
  json: { type: DataTypes.JSONB, allowNull: false },
  jsonOrNull: { type: DataTypes.JSONB },
  yes: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
  instant: { type: DataTypes.DATE, allowNull: false },
  instantOrNull: { type: DataTypes.DATE },
  version: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 1 },
  versionFromZero: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
  /** PostgreSQL's bigint arrives as a string; byte counts here stay far below 2^53 */
  bytes: (field: string) => ({
    type: DataTypes.BIGINT,
    allowNull: false,
    get(this: { getDataValue(name: string): unknown }) {
      return Number(this.getDataValue(field));
    },
  }),
} as const;

export const keyPart = <T extends object>(column: T): T & { primaryKey: true } => ({ ...column, primaryKey: true });
