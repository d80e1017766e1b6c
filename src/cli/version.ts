declare const __SPANWRIGHT_VERSION__: string;

/** From package.json, put in by the build. */
export const version = __SPANWRIGHT_VERSION__;
export const program = `Spanwright ${version}`;
