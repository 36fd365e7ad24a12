/** Timing for the benches: warm up first, then the median of many runs, which a busy machine spoils least. */

const WARM_UP_MS = 300;
const FEWEST_RUNS = 15;

/** Median time of one run over all subjects, microseconds. Runs for about `forMs` after warming up. */
export function medianTime<Subject>(
  subjects: readonly Subject[],
  run: (subject: Subject) => unknown,
  forMs = 600,
): number {
  const start = performance.now();
  while (performance.now() - start < WARM_UP_MS) for (const subject of subjects) run(subject);
  globalThis.gc?.();
  const times: number[] = [];
  const end = performance.now() + forMs;
  for (let round = 0; round < FEWEST_RUNS || performance.now() < end; round++) {
    for (const subject of subjects) {
      const before = performance.now();
      run(subject);
      times.push((performance.now() - before) * 1000);
    }
  }
  return median(times);
}

/** Median time of one run of something slow, microseconds: a few runs, the first thrown away. */
export function medianOfFew(run: () => unknown, runs = 7): number {
  run();
  globalThis.gc?.();
  const times = Array.from({ length: runs }, () => {
    const before = performance.now();
    run();
    return (performance.now() - before) * 1000;
  });
  return median(times);
}

function median(values: readonly number[]): number {
  const sorted = [...values].sort((p, q) => p - q);
  return sorted[sorted.length >> 1] ?? NaN;
}

/** 12.3 µs, 1.23 ms or 1.23 s, three figures. */
export function timeInWords(microseconds: number): string {
  if (microseconds < 1000) return `${microseconds.toPrecision(3)} µs`;
  if (microseconds < 1e6) return `${(microseconds / 1000).toPrecision(3)} ms`;
  return `${(microseconds / 1e6).toPrecision(3)} s`;
}

/** Columns set to their widest entry, the first to the left and the others to the right. */
export function table(rows: readonly (readonly string[])[]): string {
  const widths = (rows[0] ?? []).map((_, column) => Math.max(...rows.map((row) => row[column]?.length ?? 0)));
  return rows
    .map((row) =>
      row
        .map((cell, i) => (i === 0 ? cell.padEnd(widths[i] ?? 0) : cell.padStart(widths[i] ?? 0)))
        .join('   ')
        .trimEnd(),
    )
    .join('\n');
}
