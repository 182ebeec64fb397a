/**
 * The profiles of the forms, half a pot each, in millimetres: "radius,height" from the axis outwards and from the table up.
 * `outer` runs from under the foot to the lip, `inner` from the floor to the lip. A `!` marks an edge; all else is smoothed.
 */
export type ProfileText = {
  readonly outer: string;
  readonly inner: string;
  /** The middle of a handle or lug, on the right, as it is seen from outside. */
  readonly handle?: string;
  /** The outline of a spout or a pulled lip, on the left, behind the cut wall. */
  readonly spout?: string;
  /** Lid: its top from the knob to the edge, its underside from the axis to the edge. */
  readonly lid?: { readonly outer: string; readonly inner: string };
  /** A form that nothing can be poured into has no depth to measure. */
  readonly solid?: true;
};

const JUG: ProfileText = {
  outer: '0,5 38,5! 39,0! 46,0! 48,6 58,32 63,72 57,112 46,142 43,160 48,184',
  inner: '0,11 30,12 46,22 55,42 58,74 52,112 41,142 38.5,160 44,184',
  handle: '43,166 62,174 84,156 88,120 76,92 61,82',
  spout: '43,154! 52,168 70,187! 46,183!',
};

export const PROFILES = {
  plate: {
    outer: '0,4 72,4! 74,0! 81,0! 84,6! 104,11 121,20 132,31',
    inner: '0,9 60,9.5 86,11.5 104,17 119,25 130,31',
  },
  saucer: {
    outer: '0,3.5 35,3.5! 36,0! 41,0! 43,5! 58,9 69,16 77,24.5',
    inner: '0,8 28,8 46,10.5 59,16 70,22 75,24.5',
  },
  platter: {
    outer: '0,4 106,4! 108,0! 116,0! 120,6! 140,12 156,22 167,34',
    inner: '0,10 96,10.5 124,14 142,21 156,29 165,34',
  },
  bowl: {
    outer: '0,5 25,5! 27,0! 33,0! 34,8! 51,15 67,32 76,53 80,72',
    inner: '0,10 24,12 46,22 62,39 71,57 76,72',
  },
  mug: {
    outer: '0,4 27,4! 28,0! 34,0! 37,4 40.5,15 42,40 42,76 43,101',
    inner: '0,9 22,9.5 33,14 37,28 38,60 38,84 39.5,101',
    handle: '41.5,82 56,88 69,78 70,56 59,37 41.5,28',
  },
  cup: {
    outer: '0,5 17,5! 19,0! 24,0! 25,7! 35,15 42,33 45,52 47.5,68.5',
    inner: '0,8.5 16,10 29,18.5 37.5,34 41.5,52 44.5,68.5',
    handle: '43.5,54 56,60 66,50 62,36 52,29 41,29',
  },
  tumbler: {
    outer: '0,3 23,3! 24,0! 29,0! 31,4 34,22 38,66 41,113.5',
    inner: '0,8 20,8.5 28,13 30.5,30 34.5,68 38,113.5',
  },
  jug: JUG,
  creamer: {
    outer: '0,3 22,3! 23,0! 28,0! 29,5 35,20 37,40 33,60 28,76 29,90.5',
    inner: '0,7 18,7.5 27,13 32,24 33,41 29.5,60 24.5,76 26,90.5',
    handle: '28.5,80 40,86 52,76 53,58 46,44 36.5,40',
    spout: '28,74! 34,82 45,93! 28.5,90!',
  },
  teapot: {
    outer: '0,4 37,4! 39,0! 46,0! 48,6 63,24 73,56 67,88 52,108 38,117.5!',
    inner: '0,9.5 34,10.5 54,22 66,55 60.5,86 46,103 33.5,111! 33.5,117.5',
    handle: '65,90 88,103 106,86 102,56 73,44',
    spout: '66,30! 86,46 99,84 118,113! 109,118! 91,100 84,82 71,70!',
    lid: {
      outer: '0,148 8,146 11,140 6,134! 18,131 33,124 40,119! 40,117!',
      inner: '0,128 18,126 30,119 32,112',
    },
  },
  'coffee-pot': {
    outer: '0,4 44,4! 45,0! 53,0! 55,7 65,36 64,74 55,120 46,160 43,184.5',
    inner: '0,10 38,11 53,20 59,38 58.5,74 49.5,120 40.5,160 38,184.5',
    handle: '46,160 70,170 92,146 94,106 80,74 64.5,64',
    spout: '64,46! 82,66 92,130 110,180! 100,184! 83,140 76,104 62,92!',
    lid: {
      outer: '0,216 8,214 10,207 6,201! 20,198 38,191 45,187! 45,184.5!',
      inner: '0,194 20,192 34,186 36.5,179',
    },
  },
  jar: {
    outer: '0,4 41,4! 43,0! 50,0! 52,6 61,24 65,62 60,98 49,116 47,123 50,131.5',
    inner: '0,9.5 36,10 52,20 59,40 60,64 55,96 44,115 42,123 45.5,131.5',
    lid: {
      outer: '0,164 9,162 12,155 7,148! 24,146 42,140 52,134! 52,131.5!',
      inner: '0,140 22,139 38,134 41,127',
    },
  },
  bottle: {
    outer: '0,4 31,4! 33,0! 39,0! 41,6 49,30 51,90 44,140 25,170 16,190 14.5,218 18,236.5',
    inner: '0,10 28,11 40,20 45,40 46,90 39,137 20,167 11.5,190 10.5,218 13,236.5',
  },
  'baking-dish': {
    outer: '0,0 106,0 117,3 124,14 130,44 134,62.5',
    inner: '0,7 100,7 112,10 118,20 124,44 128,62.5',
    handle: '131,50 144,54 156,53',
  },
  casserole: {
    outer: '0,0 80,0 92,4 99,18 104,55 105,97.5!',
    inner: '0,8 74,8 87,12 93,24 98,56 98,97.5',
    handle: '103.5,72 116,77 126,74',
    lid: {
      outer: '0,141 10,139 13,131 8,124! 40,120 78,112 102,103! 105,98!',
      inner: '0,117 36,114 74,106 92,99 95,92',
    },
  },
  'spoon-rest': {
    outer: '0,0 36,0 47,2 56,8 62,17',
    inner: '0,5 34,5.5 45,8 53,12.5 59.5,17',
  },
  tile: { outer: '0,0 75,0! 75,9!', inner: '0,9 75,9!', solid: true },
  vase: {
    outer: '0,4 35,4! 37,0! 44,0! 46,6 61,50 70,108 60,156 39,186 36,202 45,222.5',
    inner: '0,10 32,11 43,20 56,52 65,108 55,155 34,186 31,202 41,222.5',
  },
  ornament: {
    outer: '0,0 34,0! 45,10 54,42 47,84 26,114 0,125',
    inner: '0,7 30,7.5 39,15 47.5,43 41,81 22,107 0,117.5',
    solid: true,
  },
} as const satisfies Readonly<Record<string, ProfileText>>;

/** A vessel of no form in particular, for a piece whose form is not known or is none of ours. */
export const NEUTRAL: ProfileText = {
  outer: '0,0 38,0 46,4 50,18 52,50 53,88.5',
  inner: '0,7 34,7 42,11 45.5,22 47.5,52 48.5,88.5',
};
