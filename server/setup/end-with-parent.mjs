/** Loaded first into the processes that `npm start` makes: none of them outlives it, whatever ended it. */
const GRACE_MS = 30_000;

process.once('disconnect', () => {
  process.kill(process.pid, 'SIGTERM');
  setTimeout(() => process.exit(1), GRACE_MS).unref();
});
// The channel alone is no reason to stay.
process.channel?.unref();
