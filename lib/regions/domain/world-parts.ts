/** Parts of the world in the order lists show them. Standards belong to none and come last. */
export const WORLD_PARTS = ['europe', 'north-america', 'latin-america', 'asia', 'africa', 'oceania', 'standards'] as const;
export type WorldPart = (typeof WORLD_PARTS)[number];

/**
 * Where the countries of ISO 3166-1 and the blocs lie, after the United Nations' list M49. Cyprus stands with the Union it is a
 * member of, the Antarctic with the southern seas.
 */
const CODES: Readonly<Record<Exclude<WorldPart, 'standards'>, string>> = {
  europe:
    'eu ad al at ax ba be bg by ch cy cz de dk ee es fi fo fr gb gg gi gr hr hu ie im is it je li lt lu lv mc md me mk mt nl no pl pt ro rs ru se si sj sk sm ua va xk',
  'north-america': 'us ca gl bm pm',
  'latin-america':
    'mercosur ag ai ar aw bb bl bo bq br bs bv bz cl co cr cu cw dm do ec fk gd gf gp gs gt gy hn ht jm kn ky lc mf mq ms mx ni pa pe pr py sr sv sx tc tt uy vc ve vg vi',
  asia: 'asean gso ae af am az bd bh bn bt cn ge hk id il in iq ir jo jp kg kh kp kr kw kz la lb lk mm mn mo mv my np om ph pk ps qa sa sg sy th tj tl tm tr tw uz vn ye',
  africa:
    'ao bf bi bj bw cd cf cg ci cm cv dj dz eg eh er et ga gh gm gn gq gw io ke km lr ls ly ma mg ml mr mu mw mz na ne ng re rw sc sd sh sl sn so ss st sz td tf tg tn tz ug yt za zm zw',
  oceania: 'anz aq as au cc ck cx fj fm gu hm ki mh mp nc nf nr nu nz pf pg pn pw sb tk to tv um vu wf ws',
};

const PART_OF = new Map(
  WORLD_PARTS.flatMap((part) => (part === 'standards' ? [] : CODES[part].split(' ').map((code) => [code, part] as const))),
);

/** The part of the world of a region code; a part of a country lies where its country does. What lies nowhere is a standard. */
export function worldPartOf(code: string): WorldPart {
  return PART_OF.get(code.split('-')[0] ?? code) ?? 'standards';
}

type Listed = { readonly code: string; readonly name: string; readonly kind?: string };

export type PartGroup<Region extends Listed> = { readonly part: WorldPart; readonly regions: readonly Region[] };

/**
 * Regions by part of the world; parts without any are left out. Within one: blocs first, then countries by name, each followed by
 * its own parts.
 */
export function groupByPart<Region extends Listed>(regions: readonly Region[], collator: Intl.Collator): readonly PartGroup<Region>[] {
  const names = new Map(regions.map(({ code, name }) => [code, name]));
  const rootOf = ({ code, name }: Region): string => names.get(code.split('-')[0] ?? code) ?? name;
  const isBloc = (region: Region): number => (region.kind === 'bloc' ? 0 : 1);
  const depth = ({ code }: Region): number => (code.includes('-') ? 1 : 0);
  const order = (a: Region, b: Region): number =>
    isBloc(a) - isBloc(b) ||
    collator.compare(rootOf(a), rootOf(b)) ||
    depth(a) - depth(b) ||
    collator.compare(a.name, b.name) ||
    (a.code < b.code ? -1 : 1);
  return WORLD_PARTS.map((part) => ({
    part,
    regions: regions.filter(({ code }) => worldPartOf(code) === part).sort(order),
  })).filter((group) => group.regions.length > 0);
}
