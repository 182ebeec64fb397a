import type { MetadataRoute } from 'next';
import { connection } from 'next/server';
import { listNotes } from '@/lib/notes/list-notes';
import { listWords } from '@/lib/notes/list-words';
import { listAddresses } from '@/lib/regions/list-addresses';
import { makeCtx } from '@/lib/server/ctx';
import { ownOrigin } from '@/lib/server/own-site';

const STILL = [
  '/',
  '/check',
  '/regions',
  '/readings',
  '/notes',
  '/words',
  '/substances/pb',
  '/substances/cd',
  '/changes',
  '/limits',
  '/sources',
  '/coverage',
  '/heard',
  '/day-book',
  '/privacy',
  '/cautions',
  '/accessibility',
  '/contact',
];

export default async function sitemap(): Promise<MetadataRoute.Sitemap> {
  // Drawn on request: the sheets are in the database, which a build has not got.
  await connection();
  const { regions, rules, terms } = await listAddresses(makeCtx());
  const paths = [
    ...STILL,
    ...(await listNotes()).map(({ slug }) => `/notes/${slug}`),
    ...listWords().map(({ slug }) => `/words/${slug}`),
    ...regions.map((code) => `/regions/${code}`),
    ...rules.map((id) => `/rules/${id}`),
    ...terms.map((id) => `/terms/${id}`),
  ];
  return paths.map((path) => ({ url: `${ownOrigin()}${path}` }));
}
