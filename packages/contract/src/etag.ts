/** The ETag of a version. Strong: two equal tags are the same representation. */
export const toEtag = (version: number): string => `"${version}"`

/** The version in an `If-Match` header, or null when the header holds anything but one of our tags. */
export function versionOf(header: string): number | null {
  const found = /^"([1-9]\d{0,14})"$/.exec(header.trim())
  return found ? Number(found[1]) : null
}

export const snapshotEtag = (shelfVersion: number, catalogueVersion: number): string =>
  `"s${shelfVersion}-c${catalogueVersion}"`
