import type { Mutant } from './mutants';
import { Thread } from './thread';

/** What became of a mutant: the test that failed, that it hung, or that no test noticed. */
export type Fate = { readonly mutant: Mutant; readonly by: string | null };

/** Properties first run with few cases, then, for mutants that got through, with more. A test may take so long before it counts as hung. */
const PASSES = [
  { runs: 40, ms: 3_000 },
  { runs: 160, ms: 12_000 },
] as const;

type Pass = { readonly runs: number; readonly ms: number; readonly skip: readonly string[] };

/** Tries mutants one by one and tells each fate as it is known. */
export async function hunt(bundle: string, mutants: readonly Mutant[], tell: (fate: Fate) => void): Promise<void> {
  const thread = new Thread(bundle);
  try {
    let left = mutants;
    for (const { runs, ms } of PASSES) {
      const pass = { runs, ms, skip: await unsound(thread, runs, ms) };
      const through: Mutant[] = [];
      for (const [at, mutant] of left.entries()) {
        if (at % 50 === 0) console.log(`${runs} cases: ${at} of ${left.length}`);
        const by = await tryOne(thread, mutant, pass);
        if (by === null && runs !== PASSES[1].runs) through.push(mutant);
        else tell({ mutant, by });
      }
      left = through;
    }
  } finally {
    await thread.stop();
  }
}

async function tryOne(thread: Thread, mutant: Mutant, { runs, skip, ms }: Pass): Promise<string | null> {
  const tried = await thread.try({ now: mutant.id, runs, skip }, { ms, anew: mutant.isStatic });
  return tried === null ? 'no end' : tried.failed;
}

/** The tests that fail with no mutant awake: those that count their cases do where there are few. */
async function unsound(thread: Thread, runs: number, ms: number): Promise<readonly string[]> {
  const skip: string[] = [];
  for (;;) {
    const tried = await thread.try({ now: 0, runs, skip }, { ms, anew: false });
    if (tried === null) throw new Error('A test comes to no end with no mutant awake.');
    if (tried.failed === null) return skip;
    console.log(`Left out with ${runs} cases, as it fails without any mutant: ${tried.failed}`);
    skip.push(tried.failed);
  }
}
