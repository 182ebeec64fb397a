import { readdir, readFile } from 'node:fs/promises';
import type { Knex } from 'knex';
import { parsePlacesFile, parseSheetFile, type SeedFaults, type SeedPlace } from '@/content/seed/sheet-file';
import { canonicalJson } from '@/lib/kernel/canonical-json';
import { ok, type Result } from '@/lib/kernel/result';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { listAmended, listEditions, lockSheet, lockWorld, publishEdition } from '../editions';
import { fingerprint } from '../fingerprint';
import { putRegion, replaceMemberships } from '../regions';
import { inTransaction, type Trx } from '../transaction';

const FOLDER = new URL('../../content/seed/', import.meta.url);

/** Thrown with every fault of every file, so that one run shows all there is to mend. */
class SeedRefused extends Error {}

function valuesOf<T>(results: readonly Result<T, SeedFaults>[]): readonly T[] {
  const faults = results.flatMap((result) => (result.ok ? [] : result.error));
  if (faults.length > 0) throw new SeedRefused(`The seed files need mending:\n${faults.join('\n')}`);
  return results.flatMap((result) => (result.ok ? [result.value] : []));
}

const text = (path: string): Promise<string> => readFile(new URL(path, FOLDER), 'utf8');

async function readSheets(): Promise<readonly Sheet[]> {
  const names = (await readdir(new URL('regions/', FOLDER))).filter((name) => name.endsWith('.json')).sort();
  return valuesOf(await Promise.all(names.map(async (name) => parseSheetFile(`regions/${name}`, await text(`regions/${name}`)))));
}

async function readPlaces(): Promise<readonly SeedPlace[]> {
  return valuesOf([parsePlacesFile('places.json', await text('places.json'))]).flat();
}

/**
 * Puts the founding sheets in: a sheet that is not there becomes edition 1; one whose last edition came from a seed and
 * reads otherwise by now becomes a new edition; one that people have amended is left alone, with its name, kind and layers.
 * Safe to run again.
 */
async function publishFounding(trx: Trx, sheet: Sheet, at: Date): Promise<void> {
  const number = await lockSheet(trx, sheet.code);
  if (number === null) {
    await publishEdition(trx, 1, { sheet, origin: 'seed', summary: 'Founding sheet', at });
    return;
  }
  const last = (await listEditions(trx, sheet.code)).at(-1);
  if (last?.origin !== 'seed' || last.hash === fingerprint(canonicalJson(sheet))) return;
  await publishEdition(trx, number + 1, { sheet, origin: 'seed', summary: 'Founding sheet, read again', at });
}

export async function seed(knex: Knex): Promise<void> {
  const sheets = await readSheets();
  const places = await readPlaces();
  const names = new Intl.DisplayNames(['en-GB'], { type: 'region' });
  const coded = new Set(sheets.map(({ code }) => code));
  const at = new Date();
  await inTransaction(knex, async (trx) => {
    // Held first, so that nothing comes into use while it is seen which sheets people have amended.
    await lockWorld(trx);
    const amended = await listAmended(trx);
    const ours = sheets.filter(({ code }) => !amended.has(code));
    const uncoded = places.filter(({ code }) => !coded.has(code) && !amended.has(code));
    for (const { code } of uncoded) {
      await putRegion(trx, { code, name: names.of(code.toUpperCase()) ?? code, kind: 'country' });
    }
    for (const { code, name, kind } of ours) await putRegion(trx, { code, name, kind });
    for (const { code, memberships } of [...uncoded, ...ours]) {
      await replaceMemberships(trx, code, memberships);
    }
    for (const sheet of sheets) await publishFounding(trx, sheet, at);
    return ok(null);
  });
}
