// @ts-check
import { existsSync } from 'node:fs';
import { cruise } from 'dependency-cruiser';
import extractConfig from 'dependency-cruiser/config-utl/extract-depcruise-options';
import extractTSConfig from 'dependency-cruiser/config-utl/extract-ts-config';

/** Checks the arrows between the house's parts; a check that read no file would pass for the wrong reason, so it fails. */
const folders = ['src', 'shared', 'server', 'storage', 'tests'].filter((folder) => existsSync(folder));
const options = await extractConfig('./.dependency-cruiser.cjs');
const { output } = await cruise(folders, options, undefined, { tsConfig: extractTSConfig('tsconfig.json') });
if (typeof output === 'string') throw new Error('The report is no object: another version of dependency-cruiser?');

const own = output.modules.filter((module) => folders.some((folder) => module.source.startsWith(`${folder}/`)));
for (const { from, to, rule, cycle, comment } of output.summary.violations) {
  const way = cycle ? cycle.map((step) => step.name).join(' → ') : to;
  console.error(`${rule.name}: ${from} → ${way}\n  ${comment ?? ''}`);
}
console.log(`Import rules: ${own.length} files, ${output.summary.error} broken.`);
if (own.length === 0) console.error('No file was read: the rules were not checked.');
process.exitCode = own.length === 0 || output.summary.error > 0 ? 1 : 0;
