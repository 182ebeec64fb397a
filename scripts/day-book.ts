/* Reads the day book from its first line to its last and says whether its chain holds, or where it breaks first. */
import { db } from '../db/connection';
import { verifyDayBook } from '../lib/day-book/verify-day-book';
import type { Break } from '../lib/day-book/domain/entry';

function say({ number, why }: Break): string {
  switch (why) {
    case 'missing':
      return `Line ${number} of the day book is missing.`;
    case 'not-bound':
      return `Line ${number} of the day book does not continue the line before it.`;
    case 'changed':
      return `Line ${number} of the day book was changed after it was written.`;
    case 'cut-off':
      return `The day book was cut off: line ${number} and what may have followed it are gone.`;
  }
}

try {
  const found = await verifyDayBook({ db, now: new Date() });
  console.log(found.ok ? `The day book holds: ${found.value.lines} lines, each bound to the one before.` : say(found.error));
  process.exitCode = found.ok ? 0 : 1;
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 2;
} finally {
  await db.destroy();
}
