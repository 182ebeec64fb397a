import type { FileType } from './kept-file';

const LONGEST = 200;
const NAMELESS = 'page-seen';

/** Endings under which a file of that type opens as what it is; the first is given to one that has none of them. */
const ENDINGS: Readonly<Record<FileType, readonly string[]>> = {
  'application/pdf': ['.pdf'],
  'image/png': ['.png'],
  'image/jpeg': ['.jpg', '.jpeg'],
  'image/webp': ['.webp'],
  'text/plain': ['.txt'],
};

/**
 * A file's name as it is kept for people to read: the last part of a path, without marks that nobody sees or that turn the direction
 * of reading, without dots and blanks at its ends. No file is ever looked up or written under it.
 */
export function tidyFileName(given: string): string {
  const [last = ''] = given
    .slice(0, LONGEST * 20)
    .split(/[\\/]/)
    .slice(-1);
  const tidy = last
    .normalize('NFC')
    .replace(/[\p{Cc}\p{Cf}\p{Cs}\p{Co}\p{Zl}\p{Zp}\u115f\u1160\u3164\uffa0\u2800]/gu, '')
    .replace(/[<>:"|?*;]/g, '_')
    .replace(/\p{Z}+/gu, ' ');
  const cut = Array.from(withoutEnds(tidy)).slice(0, LONGEST).join('');
  return withoutEnds(cut) === '' ? NAMELESS : withoutEnds(cut);
}

const withoutEnds = (name: string): string => name.replace(/^[. ]+/, '').replace(/[. ]{1,200}$/, '');

/** The name a file is handed out under: one that ends as its type does, so that no desktop opens it as something else. */
export function servedName(name: string, type: FileType): string {
  const endings = ENDINGS[type];
  return endings.some((ending) => name.toLowerCase().endsWith(ending)) ? name : `${name}${endings[0] ?? ''}`;
}

/** The header Content-Disposition (RFC 6266): the name in ASCII for old readers, and as it is. */
export function dispositionOf(how: 'attachment' | 'inline', name: string): string {
  const plain = name.replace(/[^A-Za-z0-9 ._-]/g, '_');
  const full = encodeURIComponent(name).replace(/['()*!]/g, (sign) => `%${sign.charCodeAt(0).toString(16).toUpperCase()}`);
  return `${how}; filename="${plain}"; filename*=UTF-8''${full}`;
}
