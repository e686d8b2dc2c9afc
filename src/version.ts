/** Put in by the bundler. */
declare const STOPLOG_VERSION: string;

/** The package's version; `unbundled` where the sources run without the bundler. */
export const version = typeof STOPLOG_VERSION === 'string' ? STOPLOG_VERSION : 'unbundled';
