export interface Served {
  readonly url: string;
  readonly port: number;
  close(): Promise<void>;
}
export declare function serveFolder(options: { readonly folder: string; readonly port: number }): Promise<Served>;
