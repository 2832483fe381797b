/** A build-up's number as it is written: BU-014. */
export function buildUpNumber(number: number): string {
  return `BU-${String(number).padStart(3, '0')}`
}
