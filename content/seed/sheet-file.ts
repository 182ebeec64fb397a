import { z } from 'zod';
import { sheetDocument, membership, regionCode } from '@/lib/regions/schema';
import type { Membership, Sheet } from '@/lib/regions/domain/sheet';
import { err, ok, type Result } from '@/lib/kernel/result';

/** What is wrong with a seed file: one line a fault, with file, rule or term, field and words. */
export type SeedFaults = readonly string[];

const named = z.looseObject({ id: z.string() });

const itemName = (raw: unknown, path: readonly PropertyKey[]): string => {
  const [list, index] = path;
  if (typeof raw !== 'object' || raw === null || (list !== 'rules' && list !== 'terms') || typeof index !== 'number') return '';
  const items: unknown = Reflect.get(raw, list);
  const item = named.safeParse(Array.isArray(items) ? items[index] : undefined);
  return item.success ? `${list === 'rules' ? 'rule' : 'term'} "${item.data.id}", ` : '';
};

const parseJson = (file: string, text: string): Result<unknown, SeedFaults> => {
  try {
    const raw: unknown = JSON.parse(text);
    return ok(raw);
  } catch (cause) {
    return err([`${file}: this is not JSON (${cause instanceof Error ? cause.message : 'unreadable'})`]);
  }
};

/** A seed sheet out of the text of its file, with defaults filled in. */
export function parseSheetFile(file: string, text: string): Result<Sheet, SeedFaults> {
  const raw = parseJson(file, text);
  if (!raw.ok) return raw;
  const parsed = sheetDocument.safeParse(raw.value);
  if (parsed.success) return ok(parsed.data);
  return err(
    parsed.error.issues.map(({ path, message }) => `${file}: ${itemName(raw.value, path)}field ${path.map(String).join('/') || '(whole)'}: ${message}`),
  );
}

const placesFile = z.strictObject({
  about: z.string(),
  places: z.array(z.strictObject({ code: regionCode, memberships: z.array(membership).default([]) })),
});

export type SeedPlace = { readonly code: string; readonly memberships: readonly Membership[] };

/** The countries and territories a maker can be established in, out of the text of `places.json`. */
export function parsePlacesFile(file: string, text: string): Result<readonly SeedPlace[], SeedFaults> {
  const raw = parseJson(file, text);
  if (!raw.ok) return raw;
  const parsed = placesFile.safeParse(raw.value);
  if (parsed.success) return ok(parsed.data.places);
  return err(parsed.error.issues.map(({ path, message }) => `${file}: field ${path.map(String).join('/')}: ${message}`));
}
