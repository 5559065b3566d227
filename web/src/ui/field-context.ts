import { createContext, use } from 'react';

export interface FieldState {
  controlId: string;
  describedBy: string | undefined;
  state: 'plain' | 'error' | 'question';
  required: boolean;
}

export const FieldContext = createContext<FieldState | null>(null);

interface ControlProps {
  id?: string | undefined;
  'aria-describedby'?: string | undefined;
  'aria-invalid'?: true | undefined;
  'aria-required'?: true | undefined;
}

/** What a control takes from the field around it: its id, its descriptions and whether it is in error. */
export const useFieldControl = (): { field: FieldState | null; controlProps: ControlProps } => {
  const field = use(FieldContext);
  if (!field) return { field, controlProps: {} };
  return {
    field,
    controlProps: {
      id: field.controlId,
      'aria-describedby': field.describedBy,
      'aria-invalid': field.state === 'error' ? true : undefined,
      'aria-required': field.required ? true : undefined,
    },
  };
};

/** The box of a control in each of its states; 40 high for staff. */
export const controlBox = (state: FieldState['state'], readOnly = false): string => {
  if (readOnly) return 'border-transparent bg-mist';
  if (state === 'error') return 'border-rowan bg-surface ring-1 ring-rowan';
  if (state === 'question') return 'border-gorse bg-surface ring-1 ring-gorse';
  return 'border-edge bg-surface';
};
