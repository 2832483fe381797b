export interface Timing {
  median: number
  p95: number
}

/** Milliseconds of each of so many runs, the first few thrown away. */
export async function time(runs: number, work: () => unknown): Promise<Timing> {
  const taken: number[] = []
  for (let run = 0; run < runs + 3; run++) {
    const start = performance.now()
    await work()
    if (run >= 3) taken.push(performance.now() - start)
  }
  taken.sort((a, b) => a - b)
  const at = (share: number) => round(taken[Math.min(taken.length - 1, Math.floor(taken.length * share))] ?? 0)
  return { median: at(0.5), p95: at(0.95) }
}

export const round = (value: number) => Math.round(value * 1000) / 1000
export const ratio = (ours: Timing, bare: Timing) => round(ours.median / bare.median)

/** Ours beside the bare way, with their ratio first. */
export function beside(ours: Timing, bare: Timing) {
  return { ratio: ratio(ours, bare), ours, bare }
}
