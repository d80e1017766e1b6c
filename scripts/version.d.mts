export declare const versionDefine: Record<string, string>;
