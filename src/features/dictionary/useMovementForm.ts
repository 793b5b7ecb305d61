import { standardSchemaResolver } from '@hookform/resolvers/standard-schema';
import { useEffect, useRef, useState } from 'react';
import { type FieldPath, useForm } from 'react-hook-form';
import type { MovementFields } from '../../../shared/contracts/movements';
import { ApiError } from '../../lib/api';
import { showRefusal } from '../../lib/forms';
import { useKeys } from '../../lib/keys';
import { keepPlace } from './keepPlace';
import { fieldsOf, MovementValues, placeInForm, tidied } from './movementValues';

/** The form of a movement. @param onSend called with what passed the schema */
export function useMovementForm(start: MovementValues, onSend: (fields: MovementFields) => void) {
  const form = useForm({ resolver: standardSchemaResolver(MovementValues), defaultValues: start });
  const element = useRef<HTMLFormElement>(null);
  const [fault, setFault] = useState<string | null>(null);
  const { isDirty } = form.formState;
  const unsaved = useRef(false);
  useEffect(() => {
    unsaved.current = isDirty;
  }, [isDirty]);

  /** Shows other values, without losing one's place. */
  const show = (values: MovementValues, as: 'saved' | 'unsaved') =>
    keepPlace(element.current, () => form.reset(values, as === 'unsaved' ? { keepDefaultValues: true } : {}));

  const refuse = (error: unknown) => {
    if (!(error instanceof ApiError)) return setFault(showRefusal<MovementValues>(error, [], form.setError));
    const fields = Object.fromEntries(
      Object.entries(error.fields).map(([field, message]) => [placeInForm(field), message]),
    );
    const placed = new ApiError(error.code, error.message, error.status, fields);
    setFault(showRefusal(placed, Object.keys(fields) as FieldPath<MovementValues>[], form.setError));
  };

  const send = form.handleSubmit(
    () => {
      setFault(null);
      const values = tidied(form.getValues());
      // the places of what the server refuses are then the form's
      if (values.points.length + values.faults.length + values.cautions.length < linesIn(form.getValues()))
        show(values, 'unsaved');
      onSend(fieldsOf(values));
    },
    () => setFault('Some of it does not fit yet. Look at the marked fields.'),
  );
  useKeys({ 'Mod+s': () => element.current?.requestSubmit() });

  return { form, element, fault, setFault, isDirty, unsaved, show, refuse, send };
}

const linesIn = ({ points, faults, cautions }: MovementValues) => points.length + faults.length + cautions.length;
