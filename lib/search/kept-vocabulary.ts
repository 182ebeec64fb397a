import 'server-only';
import { listRegionNames, listSearchWords, searchRevision } from '@/db/search';
import type { Ctx } from '@/lib/server/ctx';
import { makeVocabulary, type Vocabulary } from './domain/vocabulary';

type Db = Ctx['db'];
type Kept = { readonly of: Db; readonly revision: string; readonly read: Promise<Vocabulary> };

let kept: Kept | null = null;

/** The words of all entries, kept in memory until an entry comes or goes: then every process reads them anew. */
export async function keptVocabulary(db: Db): Promise<Vocabulary> {
  const revision = await searchRevision(db);
  if (kept?.of === db && kept.revision === revision) return kept.read;
  const made: Kept = { of: db, revision, read: readVocabulary(db) };
  kept = made;
  made.read.catch(() => {
    if (kept === made) kept = null;
  });
  return made.read;
}

async function readVocabulary(db: Db): Promise<Vocabulary> {
  const [words, regions] = await Promise.all([listSearchWords(db), listRegionNames(db)]);
  return makeVocabulary(words, regions);
}
