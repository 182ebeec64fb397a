import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';
import { COVERAGE, countCoverage, type Coverage, type CoveredCountry } from '@/lib/regions/domain/coverage';

export type Shape = { readonly code: string | null; readonly path: string };
type Props = {
  readonly countries: readonly CoveredCountry[];
  readonly shapes: readonly Shape[];
  readonly size: { width: number; height: number };
};

/** Patterns cannot be named from a style sheet of another address. */
const FILL: Partial<Record<Coverage, string>> = { 'to-confirm': 'url(#hatched)', 'no-limits': 'url(#dotted)' };

/** The four states as patterns; beside it the table says the same in words. One path a state keeps the page light. */
export function CoverageMap({ countries, shapes, size }: Props): ReactElement {
  const states = new Map(countries.map(({ code, state }) => [code, state]));
  const stateOf = (code: string | null): Coverage => (code === null ? 'no-sheet' : (states.get(code) ?? 'no-sheet'));
  const count = countCoverage(countries);
  return (
    <svg
      viewBox={`0 0 ${String(size.width)} ${String(size.height)}`}
      role="img"
      aria-labelledby="map-title map-about"
      className="coverage-map mt-6"
    >
      <title id="map-title">{words('coverage.map')}</title>
      <desc id="map-about">
        {words('coverage.about', { read: count.read, confirm: count['to-confirm'], none: count['no-limits'], without: count['no-sheet'] })}
      </desc>
      <Patterns />
      {COVERAGE.map((state) => {
        const drawn = shapes.filter(({ code }) => stateOf(code) === state);
        return <path key={state} className={`coverage-${state}`} fill={FILL[state]} d={drawn.map(({ path }) => path).join('')} />;
      })}
    </svg>
  );
}

/** Patterns are shared by the map and the legend of the same page. */
function Patterns(): ReactElement {
  return (
    <defs>
      <pattern id="hatched" width="5" height="5" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
        <rect width="5" height="5" className="coverage-ground" />
        <line x1="1" y1="0" x2="1" y2="5" className="coverage-hatch" />
      </pattern>
      <pattern id="dotted" width="5" height="5" patternUnits="userSpaceOnUse">
        <rect width="5" height="5" className="coverage-ground" />
        <circle cx="2" cy="2" r="1.1" className="coverage-dot" />
      </pattern>
    </defs>
  );
}

/** What each pattern means, with the number of countries. */
export function CoverageLegend({ countries }: Pick<Props, 'countries'>): ReactElement {
  const count = countCoverage(countries);
  return (
    <section aria-labelledby="legend" className="mt-6">
      <h2 id="legend">{words('coverage.legend')}</h2>
      <ul className="mt-3 grid gap-3 lg:grid-cols-2" role="list">
        {COVERAGE.map((state) => (
          <li key={state} className="flex items-start gap-3">
            <svg viewBox="0 0 32 20" width="48" height="30" className="coverage-map coverage-swatch mt-1 shrink-0" aria-hidden="true">
              <rect x="1" y="1" width="30" height="18" className={`coverage-${state}`} fill={FILL[state]} />
            </svg>
            <span>
              <strong className="font-strong">{words(`coverage.states.${state}`)}</strong> (
              {words('coverage.count', { count: count[state] })})
              <span className="block text-umber">{words(`coverage.meaning.${state}`)}</span>
            </span>
          </li>
        ))}
      </ul>
    </section>
  );
}
