'use strict';
// Preloaded into the processes that a launcher starts: when the launcher is gone, however it ended, they end too.
if (process.channel) {
  process.once('disconnect', () => process.kill(process.pid, 'SIGTERM'));
  process.channel.unref();
}
