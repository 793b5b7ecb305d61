import type { House } from './house';

/** What a person reads when all is up. */
export function welcome({ url, mailPage, signIns }: House, logs: string | undefined): string {
  const width = Math.max(0, ...signIns.map((signIn) => signIn.role.length));
  const people = signIns.map(({ role, email, password }) => `    ${role.padEnd(width)}  ${email}  ${password}`);
  return [
    '',
    `Tapeline is ready:  ${url}`,
    '',
    ...(mailPage ? [`  Mail that it sends:  ${mailPage}`] : []),
    ...(logs ? [`  What it notes:       ${logs}`] : []),
    ...(people.length > 0 ? ['  Demo sign-ins:', ...people] : []),
    '',
    'Ctrl-C ends everything.',
    '',
  ].join('\n');
}
