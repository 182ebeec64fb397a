import 'server-only';
import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { parseConesFile } from '@/content/cones/cones-file';
import type { ConeChart } from '@/lib/pieces/domain/cone';

const NAME = 'content/cones/cones.csv';
let kept: Promise<readonly ConeChart[]> | null = null;

/** The cone charts shipped with the program. Read once. */
export function readConeCharts(): Promise<readonly ConeChart[]> {
  kept ??= read();
  return kept;
}

async function read(): Promise<readonly ConeChart[]> {
  const charts = parseConesFile(NAME, await readFile(join(process.cwd(), NAME), 'utf8'));
  if (!charts.ok) throw new Error(charts.error.join('\n'));
  return charts.value;
}
