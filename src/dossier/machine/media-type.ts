/** By ending. Source: IANA media types; `text/plain` and `application/octet-stream` where there is none of its own. */
const types: Readonly<Record<string, string>> = {
  asc: 'text/plain',
  cff: 'application/yaml',
  csv: 'text/csv',
  dat: 'text/plain',
  gz: 'application/gzip',
  h5: 'application/x-hdf5',
  html: 'text/html',
  js: 'text/javascript',
  json: 'application/json',
  log: 'text/plain',
  md: 'text/markdown',
  mjs: 'text/javascript',
  nc: 'application/netcdf',
  parquet: 'application/vnd.apache.parquet',
  pdf: 'application/pdf',
  png: 'image/png',
  py: 'text/x-python',
  r: 'text/x-r',
  svg: 'image/svg+xml',
  tif: 'image/tiff',
  tiff: 'image/tiff',
  toml: 'application/toml',
  tsv: 'text/tab-separated-values',
  txt: 'text/plain',
  xml: 'application/xml',
  yaml: 'application/yaml',
  yml: 'application/yaml',
  zip: 'application/zip',
};

/** The media type of a file, told by its name. */
export function mediaTypeOf(path: string): string {
  const ending = /\.([a-z0-9]+)$/i.exec(path)?.[1]?.toLowerCase() ?? '';
  return (Object.hasOwn(types, ending) ? types[ending] : undefined) ?? 'application/octet-stream';
}
