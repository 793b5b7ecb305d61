import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import type { DoseRule } from '../../shared/domain/kit/doseRule';
import type { KitNeed } from '../../shared/domain/kit/kit';
import type { Caution } from '../../shared/domain/training/caution';
import type { MissingThing, Pattern } from '../../shared/domain/words';
import { columns, keyPart } from './columns';

export class KitItem extends Model<InferAttributes<KitItem>, InferCreationAttributes<KitItem>> {
  declare teamId: string;
  declare id: CreationOptional<string>;
  declare name: string;
  declare otherNames: CreationOptional<string[]>;
  /** how its absence is said: "nothing to hang from" */
  declare withoutText: string;
  declare loadMatters: CreationOptional<boolean>;
  declare version: CreationOptional<number>;
}

export class MemberKit extends Model<InferAttributes<MemberKit>, InferCreationAttributes<MemberKit>> {
  declare teamId: string;
  declare personId: string;
  declare kitItemId: string;
  declare count: number;
  /** numeric arrives as strings */
  declare loadsKg: (number | string)[];
}

export class Movement extends Model<InferAttributes<Movement>, InferCreationAttributes<Movement>> {
  declare teamId: string;
  declare id: CreationOptional<string>;
  declare name: string;
  declare otherNames: CreationOptional<string[]>;
  declare pattern: Pattern;
  declare kitNeeded: CreationOptional<KitNeed[]>;
  declare points: CreationOptional<string[]>;
  declare faults: CreationOptional<string[]>;
  declare cautions: CreationOptional<Caution[]>;
  declare pictureName: CreationOptional<string | null>;
  declare mergedIntoId: CreationOptional<string | null>;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
}

export class Substitution extends Model<InferAttributes<Substitution>, InferCreationAttributes<Substitution>> {
  declare teamId: string;
  declare id: CreationOptional<string>;
  declare fromMovementId: string;
  declare toMovementId: string;
  declare missing: MissingThing;
  declare missingKitItemId: CreationOptional<string | null>;
  declare doseRule: DoseRule;
  declare reason: string;
  declare version: CreationOptional<number>;
}

export function initDictionary(sequelize: Sequelize): void {
  const { id, teamId, text, texts, textOrNull, uuid, uuidOrNull, int, json, yes, version, instant } = columns;
  KitItem.init(
    { teamId, id, name: text, otherNames: texts, withoutText: text, loadMatters: yes, version },
    { sequelize, tableName: 'kit_items' },
  );
  MemberKit.init(
    {
      teamId: keyPart(teamId),
      personId: keyPart(uuid),
      kitItemId: keyPart(uuid),
      count: int,
      loadsKg: { type: DataTypes.ARRAY(DataTypes.DECIMAL(6, 2)), allowNull: false, defaultValue: [] },
    },
    { sequelize, tableName: 'member_kit' },
  );
  Movement.init(
    {
      teamId,
      id,
      name: text,
      otherNames: texts,
      pattern: text,
      kitNeeded: { ...json, defaultValue: [] },
      points: texts,
      faults: texts,
      cautions: { ...json, defaultValue: [] },
      pictureName: textOrNull,
      mergedIntoId: uuidOrNull,
      version,
      createdAt: instant,
    },
    { sequelize, tableName: 'movements' },
  );
  Substitution.init(
    {
      teamId,
      id,
      fromMovementId: uuid,
      toMovementId: uuid,
      missing: text,
      missingKitItemId: uuidOrNull,
      doseRule: json,
      reason: text,
      version,
    },
    { sequelize, tableName: 'substitutions' },
  );
}
