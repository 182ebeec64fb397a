import 'server-only';
import { geoEqualEarth, geoPath } from 'd3-geo';
import { feature } from 'topojson-client';
import type { GeometryCollection, Topology } from 'topojson-specification';
import atlas from 'world-atlas/countries-110m.json';
import numbers from '@/content/words/country-numbers.json';
import { MapPen } from './map-pen';

/** A country's outline as an SVG path, in a box of `MAP_SIZE`. `code` is null for land that ISO 3166-1 gives no code. */
export type CountryShape = { readonly code: string | null; readonly path: string };

/** Units of the map's view box. */
export const MAP_SIZE = { width: 720, height: 350 } as const;

/** Alpha-2 codes of ISO 3166-1 in lower case. */
export const countryCodes: readonly string[] = Object.values(numbers.codes);

let drawn: readonly CountryShape[] | undefined;

/**
 * Outlines of the countries of the world, from Natural Earth (public domain) by way of the package world-atlas (ISC), in the Equal
 * Earth projection, so that areas compare. Drawn once.
 */
export function worldMap(): readonly CountryShape[] {
  drawn ??= draw();
  return drawn;
}

type Atlas = Topology<{ countries: GeometryCollection<{ name: string }> }>;
const isAtlas = (topology: { type: string }): topology is Atlas => topology.type === 'Topology';

function draw(): readonly CountryShape[] {
  const topology: { type: string } = atlas;
  if (!isAtlas(topology)) throw new Error('The atlas of the world is of another form than expected');
  const { features } = feature(topology, topology.objects.countries);
  const codes = new Map<string, string>(Object.entries(numbers.codes));
  const projection = geoEqualEarth().fitSize([MAP_SIZE.width, MAP_SIZE.height], { type: 'Sphere' });
  const pen = new MapPen();
  const path = geoPath(projection, pen);
  // Antarctica fills the foot of the map and sells no pots.
  return features
    .filter(({ id }) => id !== '010')
    .flatMap((country) => {
      path(country);
      const line = pen.take();
      return line === '' ? [] : [{ code: codes.get(String(country.id)) ?? null, path: line }];
    });
}
