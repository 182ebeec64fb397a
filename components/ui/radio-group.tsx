import type { ReactElement, ReactNode } from 'react';
import { Choice, type Option } from './choice';
import { FieldGroup } from './field';

type Props = {
  readonly id: string;
  readonly name: string;
  readonly legend: ReactNode;
  readonly legendIsHeading?: true;
  readonly hint?: ReactNode;
  readonly error?: string | undefined;
  readonly options: readonly Option[];
  /** Last and set apart, never chosen beforehand: "I don't know yet". */
  readonly last?: Option;
  readonly chosen?: string | undefined;
};

/** One answer of a few, one a line. The first circle carries the group's id, so that a summary's link lands on it. */
export function RadioGroup({ id, name, options, last, chosen, ...group }: Props): ReactElement {
  const all = last === undefined ? options : [...options, last];
  return (
    <FieldGroup id={id} {...group}>
      {all.map((option, place) => (
        <Choice
          key={option.value}
          id={place === 0 ? id : `${id}-${option.value}`}
          type="radio"
          name={name}
          option={option}
          chosen={option.value === chosen}
          apart={option === last ? true : undefined}
        />
      ))}
    </FieldGroup>
  );
}
