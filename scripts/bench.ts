import { benchEngine } from './bench/engine';
import { benchSearch } from './bench/search';

/* npm run bench [-- name]: measures and prints Markdown tables. Without a name, all of them. */

const BENCHES: Readonly<Record<string, () => string | Promise<string>>> = { engine: benchEngine, search: benchSearch };

const [wanted] = process.argv.slice(2);
const chosen = Object.entries(BENCHES).filter(([name]) => wanted === undefined || name === wanted);
if (chosen.length === 0) {
  console.error(`There is no benchmark "${wanted ?? ''}". There are: ${Object.keys(BENCHES).join(', ')}`);
  process.exitCode = 1;
}
for (const [name, run] of chosen) console.log(`## ${name}\n\n${await run()}\n`);
