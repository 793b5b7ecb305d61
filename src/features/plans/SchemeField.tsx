import type { ComponentProps } from 'react';
import { formatScheme, parseScheme } from '../../../shared/domain/training/scheme';
import { ReadField } from './ReadField';

function readScheme(text: string) {
  const scheme = parseScheme(text);
  return 'fault' in scheme ? scheme : { understood: formatScheme(scheme) };
}

/** How a block is done, as coaches type it: “12 min AMRAP”. It may be left open. */
export function SchemeField(props: Omit<ComponentProps<typeof ReadField>, 'read' | 'empty'>) {
  return <ReadField maxLength={120} placeholder="AMRAP 12" {...props} read={readScheme} empty="fine" />;
}
