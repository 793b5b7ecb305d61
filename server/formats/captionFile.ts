import type { CaptionLine } from '../../shared/domain/captions/captionLine';

/** Something in a caption file that a person should know; `line` counts from 1 as editors do. */
export type FileFault = {
  line: number;
  reason: string;
  /** `refused`: words or times would be lost or made up, so nothing of the file is taken */
  severity: 'refused' | 'warning';
};

/** A caption line and the line of the file on which its times stand. */
export type LineInFile = CaptionLine & { line: number };

export type CaptionFileReading = { lines: LineInFile[]; faults: FileFault[] };

export const refused = (line: number, reason: string): FileFault => ({ line, reason, severity: 'refused' });
export const warning = (line: number, reason: string): FileFault => ({ line, reason, severity: 'warning' });

/** The file's rows; a line ends with CR LF, LF or CR (W3C WebVTT, "WebVTT line terminator"). */
export const rowsOf = (text: string) => text.split(/\r\n|\r|\n/);
