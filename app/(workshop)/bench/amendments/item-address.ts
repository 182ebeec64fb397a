import type { ItemKey } from '@/lib/regions/domain/sheet-items';

/** The author's page of an amendment. */
export const draftPage = (id: string): string => `/bench/amendments/${encodeURIComponent(id)}`;

/** The page of the form of one part of it. */
export const itemPage = (id: string, item: ItemKey): string => `${draftPage(id)}/${item.split('/').map(encodeURIComponent).join('/')}`;
