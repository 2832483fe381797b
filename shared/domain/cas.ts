/**
 * Is a CAS registry number right? The last digit is the sum of the others, each times its place from the right, modulo 10.
 * Example: 100-51-6: 1×1 + 2×5 + 3×0 + 4×0 + 5×1 = 16, so 6. Source: CAS, check digit verification, from memory.
 */
export function isCasNumber(text: string): boolean {
  const match = /^(\d{2,7})-(\d{2})-(\d)$/.exec(text)
  if (!match) return false
  const digits = `${match[1]}${match[2]}`.split('').reverse().map(Number)
  return digits.reduce((sum, digit, index) => sum + digit * (index + 1), 0) % 10 === Number(match[3])
}
