import 'server-only';
import type { Knex } from 'knex';
import { db } from '@/db/connection';

/** What a use case may touch besides its input: the database and the instant of the request. */
export type Ctx = { readonly db: Knex; readonly now: Date };

export const makeCtx = (): Ctx => ({ db, now: new Date() });
