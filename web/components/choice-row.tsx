import { ToggleButton } from 'react-aria-components/ToggleButton';
import { ToggleButtonGroup } from 'react-aria-components/ToggleButtonGroup';

export interface ChoiceRowProps<Key extends string> {
  label: string;
  options: readonly { id: Key; label: string }[];
  value: Key | null;
  onChange: (value: Key) => void;
  className?: string;
}

/** One of a few, all in sight: the chosen one is bold and underlined in marigold. */
export function ChoiceRow<Key extends string>({
  label,
  options,
  value,
  onChange,
  className = '',
}: ChoiceRowProps<Key>) {
  return (
    <ToggleButtonGroup
      aria-label={label}
      selectionMode="single"
      disallowEmptySelection
      selectedKeys={value === null ? [] : [value]}
      onSelectionChange={(keys) => {
        const chosen = options.find((option) => keys.has(option.id));
        if (chosen !== undefined) onChange(chosen.id);
      }}
      className={`flex flex-wrap gap-x-4 gap-y-1 ${className}`}
    >
      {options.map((option) => (
        <ToggleButton
          key={option.id}
          id={option.id}
          className="cursor-pointer border-b-2 border-transparent py-1 print:not-data-selected:hidden data-hovered:border-hairline data-selected:border-marigold data-selected:font-strong"
        >
          {option.label}
        </ToggleButton>
      ))}
    </ToggleButtonGroup>
  );
}
