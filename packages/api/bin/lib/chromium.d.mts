export function ensureChromium(): Promise<string>;
