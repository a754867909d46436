export function portFrom(text: string | undefined, fallback: number): number;
export function freePort(): Promise<number>;
export function isFree(port: number, host?: string): Promise<boolean>;
export function requirePort(port: number, host: string): Promise<void>;
