export declare function isInstalled(folder?: string): boolean;
export declare function install(): Promise<number>;
