import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import type { Role } from '../../shared/domain/words';
import { columns, keyPart } from './columns';

export class Person extends Model<InferAttributes<Person>, InferCreationAttributes<Person>> {
  declare id: CreationOptional<string>;
  /** lower case */
  declare email: string;
  declare name: string;
  /** argon2id; null until the person has chosen a password */
  declare passwordHash: CreationOptional<string | null>;
  declare noticeReadAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
}

export class Team extends Model<InferAttributes<Team>, InferCreationAttributes<Team>> {
  declare id: CreationOptional<string>;
  declare slug: string;
  declare name: string;
  /** IANA name */
  declare timeZone: string;
  declare dictionaryVersion: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
}

export class Membership extends Model<InferAttributes<Membership>, InferCreationAttributes<Membership>> {
  declare teamId: string;
  declare personId: string;
  declare role: Role;
  /** when the person last said what kit they own; null until then */
  declare kitToldAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
}

/** A single-use link sent by mail; the secret itself is in the mail alone. */
export class MailLink extends Model<InferAttributes<MailLink>, InferCreationAttributes<MailLink>> {
  declare id: CreationOptional<string>;
  declare secretHash: string;
  declare purpose: 'join' | 'reset';
  declare teamId: CreationOptional<string | null>;
  declare personId: CreationOptional<string | null>;
  declare email: string;
  declare name: CreationOptional<string | null>;
  declare role: CreationOptional<Role | null>;
  declare invitedById: CreationOptional<string | null>;
  declare expiresAt: Date;
  declare usedAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
}

export class Notice extends Model<InferAttributes<Notice>, InferCreationAttributes<Notice>> {
  declare teamId: string;
  declare id: CreationOptional<string>;
  declare personId: string;
  declare kind: 'recordingReady' | 'recordingFailed' | 'sessionPublished';
  declare subjectId: CreationOptional<string | null>;
  declare text: string;
  declare readAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
}

export class AuditEvent extends Model<InferAttributes<AuditEvent>, InferCreationAttributes<AuditEvent>> {
  declare id: CreationOptional<string>;
  declare teamId: CreationOptional<string | null>;
  declare actorId: CreationOptional<string | null>;
  /** "movement.renamed" */
  declare action: string;
  declare subjectType: string;
  declare subjectId: CreationOptional<string | null>;
  declare details: CreationOptional<Record<string, unknown>>;
  declare requestId: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
}

export function initPeople(sequelize: Sequelize): void {
  const { id, teamId, text, textOrNull, uuid, uuidOrNull, instant, instantOrNull, json, versionFromZero } = columns;
  Person.init(
    { id, email: text, name: text, passwordHash: textOrNull, noticeReadAt: instantOrNull, createdAt: instant },
    { sequelize, tableName: 'people' },
  );
  Team.init(
    { id, slug: text, name: text, timeZone: text, dictionaryVersion: versionFromZero, createdAt: instant },
    { sequelize, tableName: 'teams' },
  );
  Membership.init(
    { teamId: keyPart(teamId), personId: keyPart(uuid), role: text, kitToldAt: instantOrNull, createdAt: instant },
    { sequelize, tableName: 'memberships' },
  );
  MailLink.init(
    {
      id,
      secretHash: text,
      purpose: text,
      teamId: uuidOrNull,
      personId: uuidOrNull,
      email: text,
      name: textOrNull,
      role: textOrNull,
      invitedById: uuidOrNull,
      expiresAt: instant,
      usedAt: instantOrNull,
      createdAt: instant,
    },
    { sequelize, tableName: 'mail_links' },
  );
  Notice.init(
    { teamId, id, personId: uuid, kind: text, subjectId: uuidOrNull, text, readAt: instantOrNull, createdAt: instant },
    { sequelize, tableName: 'notices' },
  );
  AuditEvent.init(
    {
      id,
      teamId: uuidOrNull,
      actorId: uuidOrNull,
      action: text,
      subjectType: text,
      subjectId: uuidOrNull,
      details: { ...json, defaultValue: {} },
      requestId: textOrNull,
      createdAt: instant,
    },
    { sequelize, tableName: 'audit_events' },
  );
  Membership.belongsTo(Person, { foreignKey: 'personId', as: 'person' });
  Membership.belongsTo(Team, { foreignKey: 'teamId', as: 'team' });
}
