export function entryPoints(): readonly string[];
