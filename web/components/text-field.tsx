import type { ReactNode, Ref } from 'react';
import { Input } from 'react-aria-components/Input';
import { TextArea } from 'react-aria-components/TextArea';
import {
  TextField as AriaTextField,
  type TextFieldProps as AriaTextFieldProps,
} from 'react-aria-components/TextField';
import { FieldDescription, FieldLabel, FieldProblem, inputClass } from './field-parts.tsx';

export interface TextFieldProps extends Omit<
  AriaTextFieldProps,
  'className' | 'style' | 'children'
> {
  label: string;
  description?: ReactNode;
  /** What is wrong, as a sentence. */
  problem?: string | undefined;
  optional?: boolean;
  /** More than one makes it a text area. */
  rows?: number;
  placeholder?: string;
  inputRef?: Ref<HTMLInputElement & HTMLTextAreaElement>;
  className?: string;
}

/** One text with its label, hint and error, on one line or several. */
export function TextField({
  label,
  description,
  problem,
  optional = false,
  rows = 1,
  placeholder,
  inputRef,
  className = '',
  ...props
}: TextFieldProps) {
  return (
    <AriaTextField
      {...props}
      isInvalid={problem !== undefined}
      validationBehavior="aria"
      className={`grid gap-1 ${className}`}
    >
      <FieldLabel optional={optional}>{label}</FieldLabel>
      <FieldDescription>{description}</FieldDescription>
      {rows > 1 ? (
        <TextArea ref={inputRef} rows={rows} placeholder={placeholder} className={inputClass} />
      ) : (
        <Input ref={inputRef} placeholder={placeholder} className={inputClass} />
      )}
      <FieldProblem>{problem}</FieldProblem>
    </AriaTextField>
  );
}
