import { Button } from 'react-aria-components/Button';
import { ListBox, ListBoxItem } from 'react-aria-components/ListBox';
import { Popover } from 'react-aria-components/Popover';
import { Select, SelectValue } from 'react-aria-components/Select';
import { FieldDescription, FieldLabel, FieldProblem } from './field-parts.tsx';

export interface SelectFieldProps<Key extends string> {
  label: string;
  options: readonly { id: Key; label: string }[];
  /** Null where nothing is chosen yet. */
  value: Key | null;
  onChange: (value: Key) => void;
  description?: string;
  problem?: string | undefined;
  /** Stands where nothing is chosen yet. */
  placeholder?: string;
  className?: string;
}

/** One choice from a short list. */
export function SelectField<Key extends string>({
  label,
  options,
  value,
  onChange,
  description,
  problem,
  placeholder = 'Choose …',
  className = '',
}: SelectFieldProps<Key>) {
  return (
    <Select
      value={value}
      placeholder={placeholder}
      onChange={(key) => {
        const chosen = options.find((option) => option.id === key);
        if (chosen !== undefined) onChange(chosen.id);
      }}
      isInvalid={problem !== undefined}
      validationBehavior="aria"
      className={`grid gap-1 ${className}`}
    >
      <FieldLabel>{label}</FieldLabel>
      <FieldDescription>{description}</FieldDescription>
      <Button className="flex w-full cursor-pointer items-center justify-between gap-3 border border-ink bg-sheet px-3 py-2 text-start">
        <SelectValue />
        <span aria-hidden="true">▾</span>
      </Button>
      <FieldProblem>{problem}</FieldProblem>
      <Popover className="min-w-(--trigger-width) border border-ink bg-sheet">
        <ListBox items={options} className="max-h-80 overflow-auto py-1">
          {(option) => (
            <ListBoxItem
              id={option.id}
              textValue={option.label}
              className="cursor-pointer px-3 py-1.5 data-focused:bg-ink data-focused:text-paper data-selected:font-strong"
            >
              {option.label}
            </ListBoxItem>
          )}
        </ListBox>
      </Popover>
    </Select>
  );
}
