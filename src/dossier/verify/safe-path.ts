/** Why a path must not be unpacked; null where it may (RFC 8493, 5.1). */
export function whyUnsafe(path: string): string | null {
  if (path === '' || path.includes('\0')) return 'is no name of a file';
  if (path.startsWith('/') || /^[a-z]:/i.test(path))
    return 'leads to a place outside the package (an absolute path)';
  if (path.startsWith('~')) return 'may lead to somebody’s home folder (`~`)';
  if (path.includes('\\')) return 'has a backslash, which parts folders on some systems';
  const parts = path.split('/');
  if (parts.includes('..')) return 'leads out of the package (`..`)';
  return parts.includes('.') || parts.includes('') ? 'is no plain path (`.` or an empty folder name)' : null;
}
