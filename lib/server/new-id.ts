import 'server-only';

export { newId } from '@/db/new-id';
