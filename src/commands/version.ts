/** The package's version; `unbundled` where the sources run without the bundler. */
export const version = typeof STOPLOG_VERSION === 'string' ? STOPLOG_VERSION : 'unbundled';
