import type { ReactElement, ReactNode } from 'react';
import { ConditionSaid } from '@/components/amend/condition-said';
import type { FormView } from '@/components/amend/form-view';
import {
  ContactFields,
  MembershipFields,
  PlaceFields,
  SourceFields,
  TermFields,
  termSections,
  WordsFields,
} from '@/components/amend/other-fields';
import { RuleFields, ruleSections } from '@/components/amend/rule-fields';
import { TrialFields, trialSections } from '@/components/amend/trial-fields';
import { samplePots, type SampleGround } from '@/lib/checks/domain/sample-pots';
import { readCondition } from '@/lib/regions/condition-form';
import { condition as conditionSchema } from '@/lib/regions/condition-schema';
import type { Condition } from '@/lib/regions/domain/condition';
import type { Entry } from '@/lib/regions/domain/entry';
import type { ItemList, WholeItem } from '@/lib/regions/domain/sheet-items';

type Drawn = { readonly sections: readonly (readonly [id: string, title: string])[]; readonly fields: ReactNode };
type Given = { readonly list: ItemList | WholeItem; readonly view: FormView; readonly sample: SampleGround; readonly newSource: string };

/** The fields of an item's form, with what its condition says beside it. */
export function drawFields({ list, view, sample, newSource }: Given): Drawn {
  const plain = (fields: ReactElement): Drawn => ({ sections: [], fields });
  switch (list) {
    case 'rules':
      return { sections: ruleSections(), fields: <RuleFields view={view} newSource={newSource} said={said('rule', view, sample)} /> };
    case 'terms':
      return { sections: termSections(), fields: <TermFields view={view} newSource={newSource} said={said('term', view, sample)} /> };
    case 'trials':
      return { sections: trialSections(), fields: <TrialFields view={view} /> };
    case 'sources':
      return plain(<SourceFields view={view} />);
    case 'memberships':
      return plain(<MembershipFields view={view} />);
    case 'authorities':
    case 'accreditation':
      return plain(<ContactFields view={view} />);
    case 'place':
      return plain(<PlaceFields view={view} />);
    case 'text':
    case 'gaps':
      return plain(<WordsFields view={view} name={list} />);
  }
}

function said(of: 'rule' | 'term', view: FormView, sample: SampleGround): ReactElement {
  const condition = conditionOf(view.values);
  const pots = condition === null ? null : samplePots(condition, sample);
  return <ConditionSaid condition={condition} pots={pots} ground={view.ground} of={of} />;
}

/** The condition as typed, where all of it can be read. */
function conditionOf(values: Entry): Condition | null {
  const { value, faults } = readCondition(values);
  if (Object.keys(faults).length > 0) return null;
  const parsed = conditionSchema.safeParse(value);
  return parsed.success ? parsed.data : null;
}
