/**
 * A time-ordered UUID (version 7, RFC 9562) from a clock reading and 16 random bytes. The bytes come from
 * `crypto.getRandomValues`, because `crypto.randomUUID` is missing on plain http in a works' own network.
 *
 * Throws a RangeError when fewer than 16 bytes are given.
 */
export function clientIdFrom(epochMilliseconds: number, random: Uint8Array): string {
  if (random.length < 16) throw new RangeError(`client id: ${random.length} random bytes, 16 needed`)
  const bytes = Uint8Array.from(random.subarray(0, 16))
  let time = Math.floor(epochMilliseconds)
  for (let index = 5; index >= 0; index -= 1) {
    bytes[index] = time % 256
    time = Math.floor(time / 256)
  }
  bytes[6] = 0x70 | ((bytes[6] ?? 0) & 0x0f)
  bytes[8] = 0x80 | ((bytes[8] ?? 0) & 0x3f)
  const hex = Array.from(bytes, (byte) => byte.toString(16).padStart(2, '0')).join('')
  return [hex.slice(0, 8), hex.slice(8, 12), hex.slice(12, 16), hex.slice(16, 20), hex.slice(20)].join('-')
}
