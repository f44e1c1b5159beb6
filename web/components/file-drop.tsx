import type { ReactNode } from 'react';
import { DropZone } from 'react-aria-components/DropZone';
import { FileTrigger } from 'react-aria-components/FileTrigger';
import { Text } from 'react-aria-components/Text';
import { Button } from './button.tsx';

export interface FileDropProps {
  /** What is wanted: "the massing". */
  label: string;
  /** Extensions and media types that the file chooser offers. */
  acceptedFileTypes?: readonly string[];
  onFile: (file: File) => void;
  children?: ReactNode;
}

/** One file, dropped here or chosen; the button is the keyboard's way. */
export function FileDrop({ label, acceptedFileTypes, onFile, children }: FileDropProps) {
  return (
    <DropZone
      onDrop={(event) => {
        const dropped = event.items.find((item) => item.kind === 'file');
        if (dropped?.kind === 'file') void dropped.getFile().then(onFile);
      }}
      className="no-print grid justify-items-center gap-2 border border-dashed border-ink px-4 py-7 text-center data-drop-target:bg-marigold-wash data-focus-visible:outline-2"
    >
      <Text slot="label">Drop {label} here, or</Text>
      <FileTrigger
        {...(acceptedFileTypes === undefined ? {} : { acceptedFileTypes })}
        onSelect={(files) => {
          const file = files?.item(0);
          if (file !== null && file !== undefined) onFile(file);
        }}
      >
        <Button>Choose a file</Button>
      </FileTrigger>
      {children}
    </DropZone>
  );
}
