type Given = string | string[] | undefined;
export type PlacesQuery = { readonly region?: Given; readonly on?: Given; readonly why?: Given };

const first = (given: Given): string | null => (Array.isArray(given) ? (given[0] ?? null) : (given ?? null));

/** What an address says of the form of places: a link from a region sheet, or a form that came back. */
export function placesAsked({ region, on, why }: PlacesQuery): { chosen: readonly string[]; on: string; why: string | null } {
  return { chosen: region === undefined ? [] : [region].flat(), on: first(on) ?? '', why: first(why) };
}
