/** The version of the package, put in by the bundler. */
declare const STOPLOG_VERSION: string;
