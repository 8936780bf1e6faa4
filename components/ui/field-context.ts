'use client';

import { createContext, useContext } from 'react';

interface FieldWiring {
  id: string;
  describedBy: string | undefined;
  invalid: boolean;
  required: boolean;
}

export const FieldContext = createContext<FieldWiring | null>(null);

interface ControlProps {
  id?: string;
  'aria-describedby'?: string;
  'aria-invalid'?: boolean | 'true' | 'false' | 'grammar' | 'spelling';
}

/** The id and aria attributes that tie a control to the label, hint and error of the Field around it. */
export function useFieldWiring(own: ControlProps) {
  const field = useContext(FieldContext);
  return {
    id: own.id ?? field?.id,
    'aria-describedby': own['aria-describedby'] ?? field?.describedBy,
    'aria-invalid': own['aria-invalid'] ?? (field?.invalid || undefined),
    'aria-required': field?.required || undefined,
  };
}
