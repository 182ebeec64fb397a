import { readFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { ground, LARGE, PIECES, SEED } from './ground';
import { QUESTIONS } from './invented-rules';
import { figure, inRounds, rowOf } from './measure';
import { memoryOf, ownMeasures } from './own';
import { assertAgreement, overturned, peersOf, ratios } from './peers';
import { sizes } from './size';

const ROUNDS = 9;
const HEAD = '| what | unit | median | spread | aim |\n|---|---|---:|---:|---|';

function versions(): string {
  const file = path.resolve(import.meta.dirname, '../../package.json');
  const { devDependencies } = JSON.parse(readFileSync(file, 'utf8')) as { readonly devDependencies: Readonly<Record<string, string>> };
  return ['json-logic-engine', 'json-rules-engine', 'publicodes'].map((name) => `${name} ${devDependencies[name] ?? ''}`).join(', ');
}

/** Measures everything and answers with Markdown. What is compared is first made sure to agree. */
export async function benchEngine(): Promise<string> {
  const all = ground();
  const peers = peersOf(all);
  const agreement = await assertAgreement(all, peers);
  const wrong = await overturned(all, peers);
  const compared = await ratios(all, peers, ROUNDS);
  const own = ownMeasures(all);
  const figures = await inRounds(own, ROUNDS);
  const held = memoryOf(all.input);
  return [
    `${LARGE} rules × ${QUESTIONS.length} questions, ${PIECES} pieces in turn; medians of ${ROUNDS} interleaved rounds after one to warm up; seed ${SEED}.`,
    `Node ${process.version}, V8 ${process.versions.v8}, ${os.cpus()[0]?.model ?? 'unknown processor'}, ${os.cpus().length} cores; ${versions()}.`,
    agreement,
    '',
    '### Side by side with rule libraries',
    'Libraries are given facts already cut to their measure, and their exceptions are worked out for them; ratios are of the same round.',
    '',
    HEAD,
    ...compared,
    '',
    '### Wrong when answers are missing',
    'Each answer missing by an even chance, then completed. Shares of all verdicts.',
    '',
    '| engine | definite | wrong | duty missed | duty invented |\n|---|---:|---:|---:|---:|',
    ...wrong,
    '',
    '### The engine alone',
    '',
    HEAD,
    ...own.map((measure, at) => rowOf(measure, figures[at] ?? [])),
    `| memory of a compiled line of 300 rules | kB | ${figure(held)} |  | at most 1000 |`,
    '',
    '### Size',
    '',
    '| bundle | minified kB | gzip kB | eval or Function | aim |\n|---|---:|---:|---|---|',
    ...(await sizes()),
  ].join('\n');
}
