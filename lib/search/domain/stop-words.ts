/** Words that a question is made of and that tell nothing of what it is about. The database's own list is among them. */
export const STOP_WORDS: ReadonlySet<string> = new Set(
  [
    'a about after again all also am an and any are as at be been but by can com could de der des die did do does en et eller er for from get got',
    'had has have how i if il ich in is it its je just la le les may me mein min mon my need not of og ok okay on or ou our please put right shall',
    'should so some that the their them then there these they this those to too une un und use using very want was we what when where which who why',
    'will with would www you your der das den dem ein eine einer det en et til med som paa jeg kan du des est que qui pour dans sur mit ist im am zu',
    'my mine into between keep keeps go goes going gone come comes make makes made',
  ].flatMap((line) => line.split(' ')),
);

/** Words that fit everything here. Beside the name of a place they mean its sheet. */
export const GENERAL_WORDS: ReadonlySet<string> = new Set(
  'rule rules law laws legal regulation regulations requirement requirements sheet region country pottery ceramic ceramics potter pottery sell selling sale sales pot pots ware keramik céramique regeln regler'.split(
    ' ',
  ),
);
