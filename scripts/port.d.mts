export declare const defaultPort: number;
export declare function portFrom(text: string | undefined): number | undefined;
