/** A random name of 16 hexadecimal digits, for tabs and open studies; nothing secret. */
export function freshId(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(8));
  return Array.from(bytes, (byte) => byte.toString(16).padStart(2, '0')).join('');
}
