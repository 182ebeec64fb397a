import type { AccessRefusal } from '@/lib/access/domain/policy';
import { words } from '@/lib/kernel/words';
import type { BeginPlaceRefusal } from '@/lib/regions/begin-place';
import type { AnswerRemarkRefusal } from '@/lib/regions/answer-remark';
import type { NotReady, SendRefusal } from '@/lib/regions/send-amendment';

export type DraftRefusal = SendRefusal | BeginPlaceRefusal | AnswerRemarkRefusal;

type Plain = Exclude<DraftRefusal['kind'], NotReady['kind'] | AccessRefusal['kind'] | 'already-decided'>;

const PLAIN: Readonly<Record<Plain, () => string>> = {
  'not-found': () => words('amend.refused.not-found'),
  'own-amendment': () => words('amend.refused.not-found'),
  'key-reused': () => words('amend.refused.key-reused'),
  busy: () => words('amend.refused.busy'),
  'has-sheet': () => words('amend.refused.has-sheet'),
};

const FIRST: ReadonlySet<string> = new Set<AccessRefusal['kind']>([
  'sign-in',
  'not-allowed',
  'confirm-first',
  'second-factor-needed',
  'sign-in-again',
]);

const isPlain = (kind: DraftRefusal['kind']): kind is Plain => Object.hasOwn(PLAIN, kind);

/** What a refusal says, under the name of its field; `form` for what belongs to none. */
export function refusalWords(refusal: DraftRefusal): Readonly<Record<string, string>> {
  if (refusal.kind === 'intended-missing')
    return Object.fromEntries(refusal.trials.map((id) => [`intended.${id}`, words('amend.refused.intended-missing')]));
  return { form: formWords(refusal) };
}

type OfForm = Exclude<DraftRefusal, { kind: 'intended-missing' }>;

function formWords(refusal: OfForm): string {
  if (isPlain(refusal.kind)) return PLAIN[refusal.kind]();
  if (FIRST.has(refusal.kind)) return words('amend.refused.first');
  return isCounted(refusal) ? countedWords(refusal) : words(`amend.refused.${standsWords(refusal.kind)}`);
}

type Counted = Extract<OfForm, { kind: 'unfinished' | 'findings' | 'no-passage' }>;

const isCounted = (refusal: OfForm): refusal is Counted =>
  refusal.kind === 'unfinished' || refusal.kind === 'findings' || refusal.kind === 'no-passage';

function countedWords(refusal: Counted): string {
  switch (refusal.kind) {
    case 'unfinished':
      return words('amend.refused.unfinished', { count: refusal.items.length });
    case 'findings':
      return words('amend.refused.findings', { count: refusal.errors.length });
    case 'no-passage':
      return words('amend.refused.no-passage', { count: refusal.claims.length });
  }
}

const STANDS = ['superseded', 'nothing-changed', 'stale'] as const;
const standsWords = (kind: string): (typeof STANDS)[number] | 'already-decided' => STANDS.find((one) => one === kind) ?? 'already-decided';
