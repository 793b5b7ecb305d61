import { SelectField } from '../../components/TextField';
import type { SessionChoice } from './sendFile';

type Props = {
  /** sessions, newest first */
  options: readonly { value: string; label: string }[];
  choice: SessionChoice;
  onChange: (choice: SessionChoice) => void;
};

const byDate = 'by date';
const none = 'none';

/** Which session the next files belong to. */
export function UploadTo({ options, choice, onChange }: Props) {
  const value = choice.by === 'fileDate' ? byDate : (choice.sessionId ?? none);
  return (
    <SelectField
      label="New files go to"
      hint={
        choice.by === 'fileDate'
          ? 'The only session on the day a file was filmed takes it; otherwise you choose one later.'
          : 'All files that you choose from now on, until you change this.'
      }
      className="max-w-md"
      value={value}
      options={[
        { value: byDate, label: 'The session on the file’s own date' },
        { value: none, label: 'No session yet' },
        ...options,
      ]}
      onChange={({ target }) =>
        onChange(
          target.value === byDate
            ? { by: 'fileDate' }
            : { by: 'choice', sessionId: target.value === none ? null : target.value },
        )
      }
    />
  );
}
