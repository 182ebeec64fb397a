import { freshForm } from '@/lib/server/define-action';

/** A key for one more form on a page: one a submission. */
export const freshKey = (): string => freshForm().key;
