/** Heights 1 to 4 of the sixteen strokes of a record's mark: the first 32 bits of its hash, two bits a stroke, most significant first. */
export function markStrokes(hashHex: string): number[] {
  if (!/^[0-9a-f]{8}/.test(hashHex)) throw new RangeError('not lower-case hex of 32 bits or more')
  return Array.from(hashHex.slice(0, 8)).flatMap((digit) => {
    const bits = Number.parseInt(digit, 16)
    return [(bits >> 2) + 1, (bits & 3) + 1]
  })
}
