import type { Knex } from 'knex';
import type { Memberships } from '@/lib/regions/domain/line';
import type { Membership, RegionKind } from '@/lib/regions/domain/sheet';
import { exceptionRow, membershipRow, regionRow, type RegionHead } from './rows/region-row';
import type { Trx } from './transaction';

/** Every place known, by code; `edition` is null where there is no sheet. The base layer is one of them. */
export async function listRegions(db: Knex): Promise<readonly RegionHead[]> {
  const rows: unknown[] = await db('regions as r')
    .leftJoin('sheets as s', 's.region', 'r.code')
    .orderBy('r.code')
    .limit(10_000)
    .select('r.code', 'r.name', 'r.kind', 's.edition_number');
  return rows.map((row) => regionRow.parse(row));
}

/** All membership edges with their exceptions, in the order the editors fixed. */
export async function listMemberships(db: Knex): Promise<Memberships> {
  const edges: unknown[] = await db('memberships').orderBy(['region', 'position']).limit(10_000).select();
  const exceptions: unknown[] = await db('membership_exceptions').orderBy(['region', 'position', 'rule']).limit(100_000).select();
  const except = exceptions.map((row) => exceptionRow.parse(row));
  const found = new Map<string, Membership[]>();
  for (const row of edges) {
    const { region, position, parent, valid_from, valid_to } = membershipRow.parse(row);
    const own = except.filter((item) => item.region === region && item.position === position).map(({ rule, why }) => ({ rule, why }));
    found.set(region, [...(found.get(region) ?? []), { parent, from: valid_from, to: valid_to, except: own }]);
  }
  return found;
}

/** Adds the place or renames it. */
export async function putRegion(
  trx: Trx,
  region: { readonly code: string; readonly name: string; readonly kind: RegionKind },
): Promise<void> {
  await trx('regions').insert(region).onConflict('code').merge(['name', 'kind']);
}

/** Replaces all membership edges of a place. */
export async function replaceMemberships(trx: Trx, region: string, edges: readonly Membership[]): Promise<void> {
  await trx('membership_exceptions').where({ region }).del();
  await trx('memberships').where({ region }).del();
  for (const [position, edge] of edges.entries()) {
    await trx('memberships').insert({ region, position, parent: edge.parent, valid_from: edge.from, valid_to: edge.to });
    if (edge.except.length === 0) continue;
    await trx('membership_exceptions').insert(edge.except.map(({ rule, why }) => ({ region, position, rule, why })));
  }
}
