import type { ComponentProps } from 'react';
import { formatDose, parseDose } from '../../../shared/domain/training/dose';
import { ReadField } from './ReadField';

function readDose(text: string) {
  const dose = parseDose(text);
  return 'fault' in dose ? dose : { understood: formatDose(dose) };
}

/** A dose as coaches type it: “8-10 reps @ 16kg”. */
export function DoseField(props: Omit<ComponentProps<typeof ReadField>, 'read'>) {
  return <ReadField maxLength={80} placeholder="10, 6 / side, 30 s" {...props} read={readDose} />;
}
