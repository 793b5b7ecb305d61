/** What a substitution does without, unless its title says it: “Towel row, no rings” needs no “no rings” beside it. */
export const notRepeated = (missingText: string | null, title: string): string | null =>
  missingText && title.toLowerCase().includes(missingText.toLowerCase()) ? null : missingText;
