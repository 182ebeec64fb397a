/** One thing to measure: the work of one round, and in what its figure is given. */
export type Measure = {
  readonly name: string;
  readonly aim: string;
  readonly unit: 'pieces/s' | 'ms';
  /** Does the work of one round and answers with its figure. */
  readonly run: () => number | Promise<number>;
};

export const msOf = async (work: () => unknown): Promise<number> => {
  const start = performance.now();
  await work();
  return performance.now() - start;
};

/** The value below which that share of the values lies. */
export const quantile = (values: readonly number[], share: number): number =>
  values.toSorted((a, b) => a - b)[Math.min(values.length - 1, Math.floor(values.length * share))] ?? 0;

/** Every measure in turn, round after round, after one round that only warms up. A list of figures a measure. */
export async function inRounds(measures: readonly Measure[], rounds: number): Promise<readonly (readonly number[])[]> {
  const figures = measures.map((): number[] => []);
  for (let round = 0; round <= rounds; round += 1) {
    for (const [at, { run }] of measures.entries()) {
      const figure = await run();
      if (round > 0) figures[at]?.push(figure);
    }
  }
  return figures;
}

export const figure = (value: number): string => (value >= 100 ? Math.round(value).toString() : value.toPrecision(3));

/** A row of the table: median and spread. */
export function rowOf({ name, unit, aim }: Measure, figures: readonly number[]): string {
  const [least, middle, most] = [0, 0.5, 1].map((share) => figure(quantile(figures, share)));
  return `| ${name} | ${unit} | ${middle ?? ''} | ${least ?? ''} to ${most ?? ''} | ${aim} |`;
}

/** Pieces a second: every piece once, in turn, as often as makes a round of a length worth measuring. Work may be asynchronous. */
export function throughput<Piece>(
  name: string,
  aim: string,
  { pieces, times, work }: { pieces: readonly Piece[]; times: number; work: (piece: Piece) => unknown },
): Measure {
  const run = async (): Promise<number> => {
    const start = performance.now();
    for (let time = 0; time < times; time += 1) {
      for (const piece of pieces) {
        const result = work(piece);
        if (result instanceof Promise) await result;
      }
    }
    return (1000 * times * pieces.length) / (performance.now() - start);
  };
  return { name, aim, unit: 'pieces/s', run };
}
