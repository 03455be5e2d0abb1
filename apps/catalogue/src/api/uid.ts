/** A fresh outward id: 128 random bits in base64url. Works over plain HTTP too, where randomUUID does not exist. */
export function createUid(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(16))
  return btoa(String.fromCharCode(...bytes))
    .replaceAll('+', '-')
    .replaceAll('/', '_')
    .replaceAll('=', '')
}
