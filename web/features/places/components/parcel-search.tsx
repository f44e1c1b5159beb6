import { useState } from 'react';
import { ComboBox } from 'react-aria-components/ComboBox';
import { Input } from 'react-aria-components/Input';
import { ListBox, ListBoxItem } from 'react-aria-components/ListBox';
import { Popover } from 'react-aria-components/Popover';
import type { Parcel } from '../../../../shared/contracts/base-data.ts';
import { FieldDescription, FieldLabel, inputClass } from '../../../components/field-parts.tsx';
import { useParcels } from '../api/list-parcels.ts';

export interface ParcelSearchProps {
  label: string;
  description?: string;
  onPick: (parcel: Parcel) => void;
  /** Empties the field after a choice, to look for the next parcel. */
  clearOnPick?: boolean;
}

const fewestLetters = 2;
const mostSuggestions = 8;

/** Finds a parcel by the words of its address or by its number, with suggestions while one types. */
export function ParcelSearch({
  label,
  description,
  onPick,
  clearOnPick = false,
}: ParcelSearchProps) {
  const [text, setText] = useState('');
  const isLongEnough = text.trim().length >= fewestLetters;
  const parcels = useParcels(
    { q: text.trim(), pageSize: mostSuggestions },
    { enabled: isLongEnough },
  );
  const rows = isLongEnough ? (parcels.data?.rows ?? []) : [];

  return (
    <ComboBox
      className="grid gap-1"
      items={rows}
      inputValue={text}
      onInputChange={setText}
      onChange={(key) => {
        const picked = rows.find((row) => row.number === key);
        if (picked === undefined) return;
        setText(clearOnPick ? '' : picked.address);
        onPick(picked);
      }}
      value={null}
      allowsEmptyCollection={isLongEnough}
      menuTrigger="input"
    >
      <FieldLabel>{label}</FieldLabel>
      <FieldDescription>{description}</FieldDescription>
      <Input className={inputClass} autoComplete="off" />
      <Popover className="w-(--trigger-width) border border-ink bg-sheet">
        <ListBox<Parcel>
          className="max-h-80 overflow-auto py-1"
          renderEmptyState={() => (
            <p className="px-3 py-2 text-small text-ink-soft">
              {parcels.isFetching ? 'Searching …' : 'No parcel matches. Try the street alone.'}
            </p>
          )}
        >
          {(parcel) => (
            <ListBoxItem
              id={parcel.number}
              textValue={parcel.address}
              className="group cursor-pointer px-3 py-1.5 data-focused:bg-ink data-focused:text-paper"
            >
              {parcel.address}{' '}
              <span className="text-small text-ink-soft group-data-focused:text-paper">
                parcel {parcel.number}
              </span>
            </ListBoxItem>
          )}
        </ListBox>
      </Popover>
    </ComboBox>
  );
}
