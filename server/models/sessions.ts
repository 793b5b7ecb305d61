import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
  type Sequelize,
} from 'sequelize';
import type { Dose } from '../../shared/domain/training/dose';
import type { Scheme } from '../../shared/domain/training/scheme';
import type { BlockKind, MissingThing, SessionState } from '../../shared/domain/words';
import { columns } from './columns';

/** One day's training: its plan; recordings point at it. */
export class Session extends Model<InferAttributes<Session>, InferCreationAttributes<Session>> {
  declare teamId: string;
  declare id: CreationOptional<string>;
  /** a calendar date in the team's time zone */
  declare date: string;
  declare title: string;
  declare note: CreationOptional<string>;
  declare aim: CreationOptional<string>;
  declare coachId: CreationOptional<string | null>;
  declare state: CreationOptional<SessionState>;
  declare publishedAt: CreationOptional<Date | null>;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare blocks?: NonAttribute<Block[]>;
}

export class Block extends Model<InferAttributes<Block>, InferCreationAttributes<Block>> {
  declare teamId: string;
  declare id: CreationOptional<string>;
  declare sessionId: string;
  declare position: number;
  declare kind: BlockKind;
  declare title: CreationOptional<string>;
  declare scheme: CreationOptional<Scheme | null>;
  declare note: CreationOptional<string>;
  declare lines?: NonAttribute<BlockLine[]>;
}

export class BlockLine extends Model<InferAttributes<BlockLine>, InferCreationAttributes<BlockLine>> {
  declare teamId: string;
  declare id: CreationOptional<string>;
  declare blockId: string;
  declare position: number;
  declare movementId: string;
  declare dose: Dose;
  declare note: CreationOptional<string>;
  declare substitutions?: NonAttribute<LineSubstitution[]>;
}

export class LineSubstitution extends Model<
  InferAttributes<LineSubstitution>,
  InferCreationAttributes<LineSubstitution>
> {
  declare teamId: string;
  declare id: CreationOptional<string>;
  declare lineId: string;
  declare position: number;
  declare movementId: string;
  declare missing: MissingThing;
  declare missingKitItemId: CreationOptional<string | null>;
  declare dose: Dose;
  declare reason: CreationOptional<string>;
}

export function initSessions(sequelize: Sequelize): void {
  const { id, teamId, text, emptyText, uuid, uuidOrNull, int, json, jsonOrNull, version, instant, instantOrNull } =
    columns;
  Session.init(
    {
      teamId,
      id,
      date: { type: DataTypes.DATEONLY, allowNull: false },
      title: text,
      note: emptyText,
      aim: emptyText,
      coachId: uuidOrNull,
      state: { ...text, defaultValue: 'draft' },
      publishedAt: instantOrNull,
      version,
      createdAt: instant,
    },
    { sequelize, tableName: 'sessions' },
  );
  Block.init(
    { teamId, id, sessionId: uuid, position: int, kind: text, title: emptyText, scheme: jsonOrNull, note: emptyText },
    { sequelize, tableName: 'blocks' },
  );
  BlockLine.init(
    { teamId, id, blockId: uuid, position: int, movementId: uuid, dose: json, note: emptyText },
    { sequelize, tableName: 'block_lines' },
  );
  LineSubstitution.init(
    {
      teamId,
      id,
      lineId: uuid,
      position: int,
      movementId: uuid,
      missing: text,
      missingKitItemId: uuidOrNull,
      dose: json,
      reason: emptyText,
    },
    { sequelize, tableName: 'line_substitutions' },
  );
  Session.hasMany(Block, { foreignKey: 'sessionId', as: 'blocks' });
  Block.hasMany(BlockLine, { foreignKey: 'blockId', as: 'lines' });
  BlockLine.hasMany(LineSubstitution, { foreignKey: 'lineId', as: 'substitutions' });
}
