/** Wall time of one call in milliseconds: the median and the slowest of many, after as many again to warm up. */
export function measureMedian(
  run: (round: number) => void,
  rounds: number,
): { median: number; slowest: number } {
  for (let round = 0; round < rounds; round++) run(round);
  const times = Array.from({ length: rounds }, (_, round) => {
    const start = performance.now();
    run(round);
    return performance.now() - start;
  }).sort((first, second) => first - second);
  return { median: times[Math.floor(rounds / 2)] ?? Number.NaN, slowest: times.at(-1) ?? Number.NaN };
}
