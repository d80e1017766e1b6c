export declare const metaPolicy: string;
export declare const securityHeaders: Readonly<Record<string, string>>;
