import type { ReactElement, ReactNode } from 'react';
import { Choice, type Option } from './choice';
import { FieldGroup } from './field';

type Props = {
  readonly id: string;
  readonly name: string;
  readonly legend: ReactNode;
  readonly legendIsHeading?: true;
  /** Says that several may be chosen. */
  readonly hint: ReactNode;
  readonly error?: string | undefined;
  readonly options: readonly Option[];
  /** "None of these", and after it perhaps "I don't know yet". An empty form is no answer, so none has a box of its own. */
  readonly last: readonly Option[];
  readonly chosen: readonly string[];
};

/** Any number of answers. The first box carries the group's id, so that a summary's link lands on it. */
export function CheckboxGroup({ id, name, options, last, chosen, ...group }: Props): ReactElement {
  return (
    <FieldGroup id={id} {...group}>
      {[...options, ...last].map((option, place) => (
        <Choice
          key={option.value}
          id={place === 0 ? id : `${id}-${option.value}`}
          type="checkbox"
          name={name}
          option={option}
          chosen={chosen.includes(option.value)}
          apart={option === last[0] ? true : undefined}
        />
      ))}
    </FieldGroup>
  );
}
