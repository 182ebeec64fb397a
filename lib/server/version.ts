import about from '@/package.json';

export const version = about.version;
