export function step<T>(what: string, work: () => T | Promise<T>, say?: (line: string) => void): Promise<T>;
