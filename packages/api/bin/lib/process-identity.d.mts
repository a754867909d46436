export function startTime(pid: number): string | undefined;
export function parseStat(stat: string): string | undefined;
export function ownIdentity(): string;
export function isRunning(identity: string): boolean;
