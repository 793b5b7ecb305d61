import { clsx } from 'clsx';
import { type ThemeChoice as Choice, useThemeChoice } from '../lib/theme';

const choices = [
  { value: 'light', label: 'Light' },
  { value: 'dark', label: 'Dark' },
  { value: 'room', label: 'As the room' },
] as const satisfies readonly { value: Choice; label: string }[];

/** Light, dark, or as the room: the floor is dark by itself, the desk light. Fits into a menu. */
export function ThemeChoice() {
  const [choice, choose] = useThemeChoice();
  return (
    <fieldset>
      <legend className="mb-1.5 text-sm font-bold">Light or dark</legend>
      <div className="flex flex-wrap gap-1.5">
        {choices.map(({ value, label }) => (
          <label
            key={value}
            className={clsx(
              'flex min-h-targetSmall items-center rounded border-thin px-2.5 text-sm font-bold has-[:focus-visible]:outline-3 has-[:focus-visible]:outline-offset-2 has-[:focus-visible]:outline-ink',
              value === choice ? 'border-ink bg-ink text-ground' : 'border-edge hover:bg-raised',
            )}
          >
            <input
              type="radio"
              name="theme"
              value={value}
              checked={value === choice}
              onChange={() => choose(value)}
              className="sr-only"
            />
            {label}
          </label>
        ))}
      </div>
    </fieldset>
  );
}
