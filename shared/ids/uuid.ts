/**
 * Makes a UUID version 7 (RFC 9562): sortable by time, made on the device without `crypto.randomUUID`,
 * which a plain-http page lacks.
 * @param now milliseconds since the epoch
 */
export function uuidv7(now: number = Date.now()): string {
  const bytes = crypto.getRandomValues(new Uint8Array(16))
  const time = BigInt(now)
  for (let index = 0; index < 6; index += 1) bytes[index] = Number((time >> BigInt(40 - index * 8)) & 0xFFn)
  bytes[6] = ((bytes[6] ?? 0) & 0x0F) | 0x70
  bytes[8] = ((bytes[8] ?? 0) & 0x3F) | 0x80
  const hex = Array.from(bytes, byte => byte.toString(16).padStart(2, '0')).join('')
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-${hex.slice(12, 16)}-${hex.slice(16, 20)}-${hex.slice(20)}`
}
