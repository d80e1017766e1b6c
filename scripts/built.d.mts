export interface Part {
  readonly output: string;
  readonly config: string;
  readonly inputs: readonly string[];
}
export declare const page: Part;
export declare const terminal: Part;
export declare const library: Part;
export declare function isStale(part: Part): boolean;
