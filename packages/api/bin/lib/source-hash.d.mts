export function hashFiles(base: string, files: string[]): string;
export function filesBelow(folder: string): string[];
