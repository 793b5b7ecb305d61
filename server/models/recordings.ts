import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
  type Sequelize,
} from 'sequelize';
import type { MakingStep, RecordingState, StepState } from '../../shared/domain/words';
import { columns, keyPart } from './columns';

export type RecordingFailure = { code: string; message: string; retry: boolean };

export class Recording extends Model<InferAttributes<Recording>, InferCreationAttributes<Recording>> {
  declare teamId: string;
  declare id: CreationOptional<string>;
  declare sessionId: CreationOptional<string | null>;
  declare coachId: CreationOptional<string | null>;
  declare title: string;
  declare take: CreationOptional<number>;
  declare fileName: string;
  declare sizeBytes: number;
  declare contentType: string;
  declare sha256: CreationOptional<string | null>;
  /** the original's key in the store, once it is all there */
  declare originalKey: CreationOptional<string | null>;
  declare state: CreationOptional<RecordingState>;
  declare failure: CreationOptional<RecordingFailure | null>;
  declare durationMs: CreationOptional<number | null>;
  /** as shown, after rotation */
  declare width: CreationOptional<number | null>;
  declare height: CreationOptional<number | null>;
  declare fps: CreationOptional<number | null>;
  declare recordedAt: CreationOptional<Date | null>;
  declare chaptersVersion: CreationOptional<number>;
  declare cuesVersion: CreationOptional<number>;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare steps?: NonAttribute<RecordingStep[]>;
}

export class RecordingStep extends Model<InferAttributes<RecordingStep>, InferCreationAttributes<RecordingStep>> {
  declare teamId: string;
  declare recordingId: string;
  declare step: MakingStep;
  declare state: CreationOptional<StepState>;
  declare percent: CreationOptional<number>;
  /** what the result was made from: a finished step with the same input is not done again */
  declare input: CreationOptional<string | null>;
  declare startedAt: CreationOptional<Date | null>;
  declare endedAt: CreationOptional<Date | null>;
}

export class RecordingAsset extends Model<InferAttributes<RecordingAsset>, InferCreationAttributes<RecordingAsset>> {
  declare teamId: string;
  declare id: CreationOptional<string>;
  declare recordingId: string;
  declare kind: 'playback' | 'poster' | 'chapterPicture';
  /** last part of its key in the store, derived from its input */
  declare name: string;
  declare chapterId: CreationOptional<string | null>;
  declare atMs: CreationOptional<number | null>;
  declare contentType: string;
  declare sizeBytes: number;
  declare width: CreationOptional<number | null>;
  declare height: CreationOptional<number | null>;
  declare details: CreationOptional<Record<string, unknown>>;
  declare createdAt: CreationOptional<Date>;
}

export class Upload extends Model<InferAttributes<Upload>, InferCreationAttributes<Upload>> {
  declare teamId: string;
  declare id: CreationOptional<string>;
  declare recordingId: string;
  declare personId: string;
  declare requestKey: string;
  declare objectKey: string;
  declare storeUploadId: string;
  declare partBytes: number;
  declare partCount: number;
  declare sizeBytes: number;
  declare state: CreationOptional<'open' | 'completed' | 'aborted'>;
  declare createdAt: CreationOptional<Date>;
}

export class UploadPart extends Model<InferAttributes<UploadPart>, InferCreationAttributes<UploadPart>> {
  declare teamId: string;
  declare uploadId: string;
  declare number: number;
  declare etag: string;
  declare sizeBytes: number;
  /** base64, as the store checks it */
  declare sha256: string;
}

export class WatchPlace extends Model<InferAttributes<WatchPlace>, InferCreationAttributes<WatchPlace>> {
  declare teamId: string;
  declare personId: string;
  declare recordingId: string;
  declare atMs: number;
  declare updatedAt: CreationOptional<Date>;
}

export function initRecordings(sequelize: Sequelize): void {
  const {
    id,
    teamId,
    text,
    textOrNull,
    uuid,
    uuidOrNull,
    int,
    intOrNull,
    json,
    jsonOrNull,
    version,
    versionFromZero,
    instant,
    instantOrNull,
    bytes,
  } = columns;
  Recording.init(
    {
      teamId,
      id,
      sessionId: uuidOrNull,
      coachId: uuidOrNull,
      title: text,
      take: { ...int, defaultValue: 1 },
      fileName: text,
      sizeBytes: bytes('sizeBytes'),
      contentType: text,
      sha256: textOrNull,
      originalKey: textOrNull,
      state: { ...text, defaultValue: 'uploading' },
      failure: jsonOrNull,
      durationMs: intOrNull,
      width: intOrNull,
      height: intOrNull,
      fps: {
        type: DataTypes.DECIMAL(8, 4),
        get(this: Recording) {
          const value = this.getDataValue('fps');
          return value === null || value === undefined ? null : Number(value);
        },
      },
      recordedAt: instantOrNull,
      chaptersVersion: versionFromZero,
      cuesVersion: versionFromZero,
      version,
      createdAt: instant,
    },
    { sequelize, tableName: 'recordings' },
  );
  RecordingStep.init(
    {
      teamId,
      recordingId: keyPart(uuid),
      step: keyPart(text),
      state: { ...text, defaultValue: 'waiting' },
      percent: { ...int, defaultValue: 0 },
      input: textOrNull,
      startedAt: instantOrNull,
      endedAt: instantOrNull,
    },
    { sequelize, tableName: 'recording_steps' },
  );
  RecordingAsset.init(
    {
      teamId,
      id,
      recordingId: uuid,
      kind: text,
      name: text,
      chapterId: uuidOrNull,
      atMs: intOrNull,
      contentType: text,
      sizeBytes: bytes('sizeBytes'),
      width: intOrNull,
      height: intOrNull,
      details: { ...json, defaultValue: {} },
      createdAt: instant,
    },
    { sequelize, tableName: 'recording_assets' },
  );
  Upload.init(
    {
      teamId,
      id,
      recordingId: uuid,
      personId: uuid,
      requestKey: uuid,
      objectKey: text,
      storeUploadId: text,
      partBytes: bytes('partBytes'),
      partCount: int,
      sizeBytes: bytes('sizeBytes'),
      state: { ...text, defaultValue: 'open' },
      createdAt: instant,
    },
    { sequelize, tableName: 'uploads' },
  );
  UploadPart.init(
    {
      teamId,
      uploadId: keyPart(uuid),
      number: keyPart(int),
      etag: text,
      sizeBytes: bytes('sizeBytes'),
      sha256: text,
    },
    { sequelize, tableName: 'upload_parts' },
  );
  WatchPlace.init(
    { teamId: keyPart(teamId), personId: keyPart(uuid), recordingId: keyPart(uuid), atMs: int, updatedAt: instant },
    { sequelize, tableName: 'watch_places' },
  );
  Recording.hasMany(RecordingStep, { foreignKey: 'recordingId', as: 'steps' });
}
