export type PackageForm = 'folder' | 'zip' | 'tar.gz';

/** The form that a name asks for. */
export function formOf(name: string): PackageForm {
  if (/\.zip$/i.test(name)) return 'zip';
  return /\.(?:tar\.gz|tgz)$/i.test(name) ? 'tar.gz' : 'folder';
}
