import { useState } from 'react';
import { TextField, type TextFieldProps } from './text-field.tsx';

export interface NumberFieldProps extends Omit<
  TextFieldProps,
  'value' | 'onChange' | 'type' | 'inputMode' | 'rows'
> {
  /** NaN where nothing, or no number, is written. */
  value: number;
  onChange: (value: number) => void;
  /** What a person writes is so many times the value: 100 for a share in per cent. */
  scale?: number;
}

/** A number that is read while one types; both a point and a comma begin its decimals. */
export function NumberField({ value, onChange, scale = 1, ...props }: NumberFieldProps) {
  const [text, setText] = useState(() => write(value, scale));
  // Another value from outside is written anew; what is being typed stays as it is typed.
  if (!Object.is(read(text, scale), value)) setText(write(value, scale));
  return (
    <TextField
      {...props}
      inputMode="decimal"
      value={text}
      onChange={(typed) => {
        setText(typed);
        onChange(read(typed, scale));
      }}
    />
  );
}

function read(text: string, scale: number): number {
  const plain = text.trim().replace(',', '.');
  return /^-?(?:\d+\.?\d*|\.\d+)$/.test(plain) ? round(Number(plain) / scale) : Number.NaN;
}

function write(value: number, scale: number): string {
  return Number.isFinite(value) ? String(round(value * scale)) : '';
}

/** Without the last digits, in which a product of decimals is off. */
function round(value: number): number {
  return Number(value.toPrecision(12));
}
