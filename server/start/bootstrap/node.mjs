// @ts-check

import { CannotStart } from '../cannotStart.mjs';

const needed = [20, 19];

export function checkNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  if (major > needed[0] || (major === needed[0] && minor >= needed[1])) return;
  throw new CannotStart(`Tapeline needs Node ${needed.join('.')} or newer; this is ${process.versions.node}.`);
}
