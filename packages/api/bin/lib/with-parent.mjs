// Preloaded into the server by `npm start`. It has no part in the server's work.

// After kill -9 of the start script nobody would end this process, and it would keep the port.
process.on('disconnect', () => process.exit(1));
process.channel?.unref();

// What nobody caught is told to the start script, which has a sentence for it, instead of a stack trace.
process.on('uncaughtException', (error) => {
  const { code, message, stack } = error ?? {};
  if (!process.connected) process.exit(1);
  process.send({ crashed: { code, message: message ?? String(error), stack } }, () => process.exit(1));
});
