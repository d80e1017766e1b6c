import type { Browser } from "playwright-core";

export declare function findBrowser(): Promise<{ readonly executablePath: string; readonly env: NodeJS.ProcessEnv }>;
export declare function launchBrowser(args?: readonly string[]): Promise<Browser>;
