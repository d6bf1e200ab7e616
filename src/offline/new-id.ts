/** A new random id (UUID version 4). `crypto.randomUUID` is missing where the page is not served over a secure origin,
 *  so the same bytes are written out by hand there. Source: RFC 9562, section 5.4. */
export function newId(): string {
  if (typeof crypto.randomUUID === 'function') return crypto.randomUUID()
  const bytes = crypto.getRandomValues(new Uint8Array(16))
  const hex = Array.from(bytes, (byte, index) => {
    if (index === 6) return ((byte & 0x0f) | 0x40).toString(16).padStart(2, '0')
    if (index === 8) return ((byte & 0x3f) | 0x80).toString(16).padStart(2, '0')
    return byte.toString(16).padStart(2, '0')
  }).join('')
  return hex.replace(/^(.{8})(.{4})(.{4})(.{4})(.{12})$/, '$1-$2-$3-$4-$5')
}
