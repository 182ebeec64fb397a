import { existsSync, mkdirSync, readFileSync, readdirSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { readLetter } from './letter.mjs';

const MOST = 500;
const NAME = /^\d{8,20}-\d{6}\.json$/;

/** The mails of the stand-in: a file each, so that they are there after a restart. Whoever waits for one is told when it comes. */
export function openLetterBox(folder) {
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  const waiting = new Set();
  let count = 0;
  const names = () =>
    readdirSync(folder)
      .filter((name) => NAME.test(name))
      .sort();
  const read = (name) => {
    const file = path.join(folder, name);
    if (!NAME.test(name) || !existsSync(file)) return null;
    const { envelope, source } = JSON.parse(readFileSync(file, 'utf8'));
    return { name, envelope, ...readLetter(source) };
  };
  return {
    read,

    /** Keeps a mail. It is there, whole, when this returns. */
    keep(envelope, source) {
      count += 1;
      const name = `${Date.now()}-${String(count).padStart(6, '0')}.json`;
      const file = path.join(folder, name);
      writeFileSync(`${file}.new`, JSON.stringify({ envelope, source }), { mode: 0o600 });
      renameSync(`${file}.new`, file);
      for (const old of names().slice(0, -MOST)) rmSync(path.join(folder, old), { force: true });
      for (const tell of [...waiting]) tell();
    },

    /** Mails to an address (to all, when it is empty) that came after the one named, oldest first. */
    list({ to = '', after = '' } = {}) {
      const wanted = to.toLowerCase();
      const newer = names().filter((name) => name > after);
      const letters = newer.map(read).filter((letter) => letter !== null);
      return wanted === '' ? letters : letters.filter(({ envelope }) => envelope.to.some((one) => one.toLowerCase() === wanted));
    },

    /** Resolves when the next mail has come, or after so many milliseconds. */
    next(limitMs) {
      return new Promise((resolve) => {
        const tell = () => {
          clearTimeout(limit);
          waiting.delete(tell);
          resolve();
        };
        const limit = setTimeout(tell, limitMs);
        waiting.add(tell);
      });
    },
  };
}
