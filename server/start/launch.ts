import path from 'node:path';
import { giveUp } from './cannotStart.mjs';
import { builtEntries } from './entries';
import { Opening } from './house';
import { choosePort } from './ports';
import { endOnSignal } from './signals';
import { welcome } from './welcome';

/** The built product on this machine: what `npm start` hands over to, and what the browser tests start as a process. */
const opening = new Opening();
const signalled = endOnSignal(opening);
const dataFolder = path.resolve(process.env.TAPELINE_DATA || 'storage/data');

try {
  const host = process.env.HOST || '127.0.0.1';
  const { port, release } = await choosePort(process.env.PORT, host);
  opening.onEnd(release);
  const house = await opening.open({
    entries: builtEntries,
    dataFolder,
    host,
    webPort: port,
    frontPort: port,
    mode: 'production',
    say: (line) => console.log(line),
  });
  console.log(welcome(house, path.relative('.', path.join(dataFolder, 'log'))));
  const { url, mailPage, databaseUrl, signIns } = house;
  process.send?.({ url, mailPage, databaseUrl, signIns });
} catch (error) {
  await opening.close();
  if (!signalled()) giveUp(error);
}
