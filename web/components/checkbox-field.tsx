export interface CheckboxFieldProps {
  label: string;
  isSelected: boolean;
  onChange: (isSelected: boolean) => void;
  className?: string;
}

/** Yes or no, with a tick. */
export function CheckboxField({ label, isSelected, onChange, className = '' }: CheckboxFieldProps) {
  return (
    <label className={`flex min-h-6 cursor-pointer items-start gap-2 ${className}`}>
      <input
        type="checkbox"
        className="mt-0.5 size-5 flex-none accent-ink"
        checked={isSelected}
        onChange={(event) => onChange(event.target.checked)}
      />
      {label}
    </label>
  );
}
