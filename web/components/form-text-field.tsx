import { useController, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { TextField, type TextFieldProps } from './text-field.tsx';

export interface FormTextFieldProps<Values extends FieldValues, Output> extends Omit<
  TextFieldProps,
  'name' | 'value' | 'onChange' | 'onBlur' | 'problem' | 'inputRef'
> {
  control: Control<Values, unknown, Output>;
  name: FieldPath<Values>;
}

/** A text field bound to a form; its error is the schema's sentence. */
export function FormTextField<Values extends FieldValues, Output>({
  control,
  name,
  ...props
}: FormTextFieldProps<Values, Output>) {
  const { field, fieldState } = useController({ control, name });
  const value: unknown = field.value;
  return (
    <TextField
      {...props}
      name={field.name}
      value={typeof value === 'string' ? value : ''}
      onChange={field.onChange}
      onBlur={field.onBlur}
      inputRef={field.ref}
      problem={fieldState.error?.message}
    />
  );
}
