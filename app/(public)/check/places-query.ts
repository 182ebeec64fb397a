type Given = string | string[] | undefined;
export type PlacesQuery = { readonly region?: Given; readonly on?: Given; readonly why?: Given; readonly with?: Given };

type PlacesAsked = {
  readonly chosen: readonly string[];
  readonly on: string;
  readonly why: string | null;
  readonly fromNote: string | null;
};

const first = (given: Given): string | null => (Array.isArray(given) ? (given[0] ?? null) : (given ?? null));

/** What an address says of the form of places: a link from a region sheet, or a form that came back. */
export function placesAsked({ region, on, why, with: fromNote }: PlacesQuery): PlacesAsked {
  return { chosen: region === undefined ? [] : [region].flat(), on: first(on) ?? '', why: first(why), fromNote: first(fromNote) };
}
