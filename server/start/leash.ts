/**
 * Loaded into every process that a launcher starts: when the launcher is gone, however it went, the process ends itself
 * in order, and with all that it started when that takes too long.
 */
const patienceMs = 8000;

if (process.connected) {
  process.once('disconnect', () => {
    setTimeout(() => {
      try {
        // the launcher made this process the first of a group
        process.kill(-process.pid, 'SIGKILL');
      } catch {
        process.exit(1);
      }
    }, patienceMs).unref();
    process.kill(process.pid, 'SIGTERM');
  });
  // the channel alone must not keep a process alive that has ended its work
  process.channel?.unref();
}
