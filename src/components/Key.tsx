const names: Record<string, string> = {
  ArrowLeft: '←',
  ArrowRight: '→',
  ArrowUp: '↑',
  ArrowDown: '↓',
  Escape: 'Esc',
  Backspace: '⌫',
};

/** `Mod` is Command on a Mac and Ctrl elsewhere. */
function shown(part: string): string {
  if (part === 'Mod') return /Mac|iP(hone|ad)/.test(navigator.platform) ? '⌘' : 'Ctrl';
  return names[part] ?? (part.length === 1 ? part.toUpperCase() : part);
}

/** A key beside what it does; where fingers work, buttons and labels do without it. @param name as src/lib/keys.ts writes it: `s`, `Space`, `Shift+ArrowLeft` */
export function Key({ name }: { name: string }) {
  return (
    <kbd className="inline-flex flex-none gap-0.5 rounded border-thin border-b-3 border-edge bg-surface px-1.25 py-0.75 font-sans text-[0.71875rem] leading-none font-bold whitespace-nowrap text-ink2 pointer-coarse:in-[button]:hidden pointer-coarse:in-[label]:hidden">
      {name.split('+').map(shown).join(' ')}
    </kbd>
  );
}
