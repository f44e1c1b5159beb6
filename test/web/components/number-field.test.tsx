import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { NumberField } from '../../../web/components/number-field.tsx';

afterEach(cleanup);

function renderField(initial: number, scale = 1) {
  const onChange = vi.fn<(value: number) => void>();
  function Field() {
    const [value, setValue] = useState(initial);
    return (
      <NumberField
        label="Figure"
        scale={scale}
        value={value}
        onChange={(next) => {
          onChange(next);
          setValue(next);
        }}
      />
    );
  }
  render(<Field />);
  const field = screen.getByLabelText<HTMLInputElement>('Figure');
  return {
    field,
    onChange,
    type: (value: string) => fireEvent.change(field, { target: { value } }),
  };
}

describe('a field for a number', () => {
  it.each([
    ['2.5', 2.5],
    ['2,5', 2.5],
    ['.5', 0.5],
    [' 7 ', 7],
    ['-3', -3],
    ['', NaN],
    ['two', NaN],
    ['1e3', NaN],
    ['1.2.3', NaN],
  ])('reads %j as %d and leaves it as it is typed', (text, value) => {
    const { field, onChange, type } = renderField(1);
    type(text);
    expect(onChange).toHaveBeenLastCalledWith(value);
    expect(field.value).toBe(text);
  });

  it('shows a share in per cent without the last digits of a product', () => {
    // 0.55 × 100 is 55.00000000000001 in binary arithmetic.
    const { field, onChange, type } = renderField(0.55, 100);
    expect(field.value).toBe('55');
    type('12.5');
    expect(onChange).toHaveBeenLastCalledWith(0.125);
  });
});
