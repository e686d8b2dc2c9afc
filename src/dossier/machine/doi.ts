/** A DOI as an address, however it was written. */
export function doiAddress(doi: string): string {
  return `https://doi.org/${encodeURI(plainDoi(doi))}`;
}

/** A DOI without `doi:` or the resolver's address before it. */
export function plainDoi(doi: string): string {
  return doi.trim().replace(/^(https?:\/\/(dx\.)?doi\.org\/|doi:\s*)/i, '');
}
