import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import type { ChapterKind, CueKind, MissingThing } from '../../shared/domain/words';
import { columns, keyPart } from './columns';

/** What people mark on a recording: chapters, caption lines, cues, and every version of the three. */

export class ChapterRow extends Model<InferAttributes<ChapterRow>, InferCreationAttributes<ChapterRow>> {
  declare teamId: string;
  declare id: string;
  declare recordingId: string;
  declare startMs: number;
  declare endMs: number;
  declare kind: ChapterKind;
  declare title: string;
  declare note: CreationOptional<string>;
  declare blockId: CreationOptional<string | null>;
  declare movementId: CreationOptional<string | null>;
  declare standsInForMovementId: CreationOptional<string | null>;
  declare missing: CreationOptional<MissingThing | null>;
  declare missingKitItemId: CreationOptional<string | null>;
}

export class CaptionTrack extends Model<InferAttributes<CaptionTrack>, InferCreationAttributes<CaptionTrack>> {
  declare teamId: string;
  declare id: CreationOptional<string>;
  declare recordingId: string;
  declare language: CreationOptional<string>;
  declare version: CreationOptional<number>;
}

export class CaptionLineRow extends Model<InferAttributes<CaptionLineRow>, InferCreationAttributes<CaptionLineRow>> {
  declare teamId: string;
  declare trackId: string;
  declare position: number;
  declare startMs: number;
  declare endMs: number;
  declare text: string;
}

export class CueRow extends Model<InferAttributes<CueRow>, InferCreationAttributes<CueRow>> {
  declare teamId: string;
  declare id: string;
  declare recordingId: string;
  declare atMs: number;
  declare kind: CueKind;
  declare text: string;
  declare movementId: CreationOptional<string | null>;
}

export type DocumentName = 'chapters' | 'cues' | 'captions';

export class DocumentVersion extends Model<InferAttributes<DocumentVersion>, InferCreationAttributes<DocumentVersion>> {
  declare teamId: string;
  declare recordingId: string;
  declare document: DocumentName;
  declare version: number;
  declare authorId: CreationOptional<string | null>;
  declare how: 'edit' | 'import' | 'restore' | 'made';
  declare origin: CreationOptional<string | null>;
  declare content: unknown;
  declare createdAt: CreationOptional<Date>;
}

export function initMarks(sequelize: Sequelize): void {
  const { teamId, text, emptyText, textOrNull, uuid, uuidOrNull, int, json, versionFromZero, instant, id } = columns;
  ChapterRow.init(
    {
      teamId,
      id: keyPart(uuid),
      recordingId: uuid,
      startMs: int,
      endMs: int,
      kind: text,
      title: text,
      note: emptyText,
      blockId: uuidOrNull,
      movementId: uuidOrNull,
      standsInForMovementId: uuidOrNull,
      missing: textOrNull,
      missingKitItemId: uuidOrNull,
    },
    { sequelize, tableName: 'chapters' },
  );
  CaptionTrack.init(
    { teamId, id, recordingId: uuid, language: { ...text, defaultValue: 'en' }, version: versionFromZero },
    { sequelize, tableName: 'caption_tracks' },
  );
  CaptionLineRow.init(
    {
      teamId,
      trackId: keyPart(uuid),
      position: keyPart(int),
      startMs: int,
      endMs: int,
      text,
    },
    { sequelize, tableName: 'caption_lines', timestamps: false },
  );
  CueRow.init(
    { teamId, id: keyPart(uuid), recordingId: uuid, atMs: int, kind: text, text, movementId: uuidOrNull },
    { sequelize, tableName: 'cues' },
  );
  DocumentVersion.init(
    {
      teamId,
      recordingId: keyPart(uuid),
      document: keyPart(text),
      version: keyPart(int),
      authorId: uuidOrNull,
      how: text,
      origin: textOrNull,
      content: json,
      createdAt: instant,
    },
    { sequelize, tableName: 'document_versions' },
  );
}
