/** The acts that the day book tells of so far, by the kind a reader asks for. A slice that writes another adds it here. */
export const ACTS = {
  sheets: ['amendment.approve', 'edition.withdraw'],
  amendments: ['amendment.send', 'amendment.hold', 'amendment.send-back', 'amendment.once-approve', 'amendment.refuse-stale'],
  doubts: ['doubt.answer'],
  keepers: ['keeper.take-on', 'keeper.give-up'],
  roles: ['role.grant', 'role.take', 'role.refuse'],
  accounts: ['account.close', 'account.reopen', 'account.forget'],
  service: ['outbox.retry'],
} as const;

export type ActKind = keyof typeof ACTS;
export type Act = (typeof ACTS)[ActKind][number];

export const ACT_KINDS = [
  'sheets',
  'amendments',
  'doubts',
  'keepers',
  'roles',
  'accounts',
  'service',
] as const satisfies readonly ActKind[];

const KNOWN: ReadonlySet<string> = new Set(Object.values(ACTS).flat());

export const isAct = (did: string): did is Act => KNOWN.has(did);
