import { useState } from 'react';
import { Button } from './button.tsx';

export interface SearchFormProps {
  label: string;
  /** The words that were searched for last. */
  value: string;
  onSearch: (value: string) => void;
  placeholder?: string;
}

/** A search that is sent with Enter or the button. */
export function SearchForm({ label, value, onSearch, placeholder }: SearchFormProps) {
  const [text, setText] = useState(value);
  return (
    <search>
      <form
        className="flex max-w-xl items-end gap-3"
        onSubmit={(event) => {
          event.preventDefault();
          onSearch(text.trim());
        }}
      >
        <label className="grid min-w-0 grow gap-1">
          <span className="font-strong">{label}</span>
          <input
            type="search"
            name="q"
            value={text}
            placeholder={placeholder}
            onChange={(event) => setText(event.target.value)}
            className="w-full border border-ink bg-sheet px-3 py-2 placeholder:text-ink-soft"
          />
        </label>
        <Button type="submit">Search</Button>
      </form>
    </search>
  );
}
