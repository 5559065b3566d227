import { useState, type ComponentProps } from 'react';
import { parseDecimal } from '../lib/parse-decimal';
import { TextInput } from './text-input';

interface NumberInputProps extends Omit<
  ComponentProps<typeof TextInput>,
  'value' | 'defaultValue' | 'onChange' | 'type' | 'inputMode'
> {
  value: number | null | undefined;
  /** Empty is null; text that is not a number is NaN, which no schema accepts. */
  onValueChange: (value: number | null) => void;
}

const sameNumber = (a: number | null | undefined, b: number | null): boolean => Object.is(a ?? null, b);
const write = (value: number | null | undefined): string =>
  value === null || value === undefined || Number.isNaN(value) ? '' : String(value);

/** Takes a comma or a point, keeps what was typed as it was typed, and never turns an empty field into 0. */
export const NumberInput = ({ value, onValueChange, ...rest }: NumberInputProps) => {
  const [text, setText] = useState(write(value));
  // A value set from outside (a draft, an answered question) replaces the text; typing does not come back changed.
  const shown = sameNumber(value, parseDecimal(text)) ? text : write(value);
  return (
    <TextInput
      {...rest}
      inputMode="decimal"
      autoComplete="off"
      value={shown}
      onChange={(event) => {
        setText(event.target.value);
        onValueChange(parseDecimal(event.target.value));
      }}
    />
  );
};
