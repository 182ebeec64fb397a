import type { ReactElement, ReactNode } from 'react';

export type Option = { readonly value: string; readonly label: ReactNode; readonly hint?: ReactNode };

type Props = {
  readonly id: string;
  readonly type: 'radio' | 'checkbox';
  readonly name: string;
  readonly option: Option;
  readonly chosen: boolean;
  /** Set off by a line, after the others: "I don't know yet", "None of these". */
  readonly apart?: true | undefined;
};

/** One line to press, with the browser's own circle or box. */
export function Choice({ id, type, name, option, chosen, apart }: Props): ReactElement {
  const hintOf = option.hint === undefined ? {} : { 'aria-describedby': `${id}-about` };
  const line = (
    <label className="choice" htmlFor={id}>
      <input id={id} type={type} name={name} value={option.value} defaultChecked={chosen} {...hintOf} />
      <span>
        {option.label}
        {option.hint === undefined ? null : (
          <span id={`${id}-about`} className="choice-hint">
            {option.hint}
          </span>
        )}
      </span>
    </label>
  );
  return apart === true ? <div className="choice-apart">{line}</div> : line;
}
