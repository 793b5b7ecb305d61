/** What is used of webvtt-parser, which ships without types. */
declare module 'webvtt-parser' {
  export type WebvttNode =
    | { type: 'text'; value: string }
    | { type: 'object'; name: string; children: WebvttNode[] }
    | { type: 'timestamp'; value: number };
  export type WebvttCue = {
    id: string;
    /** seconds */
    startTime: number;
    endTime: number;
    text: string;
    tree: { children: WebvttNode[] };
  };
  export type WebvttError = { message: string; line: number; col?: number };
  class WebVTTParser {
    constructor(entities?: Record<string, string>);
    parse(input: string, mode?: 'metadata' | 'chapters'): { cues: WebvttCue[]; errors: WebvttError[] };
  }
  const webvtt: { WebVTTParser: typeof WebVTTParser };
  export default webvtt;
}
