const longestDrainMs = 10_000;

/** On SIGTERM, SIGINT or a parent gone: no new connections, what is under way is finished, then the process ends. */
export function stopGracefully({ server, log }) {
  let isStopping = false;
  const stop = (why) => {
    if (isStopping) return;
    isStopping = true;
    log.info({ why }, "stopping");
    // The database pool keeps the process alive, so it has to be ended in so many words.
    server.close(() => process.exit(0));
    server.closeIdleConnections();
    setInterval(() => server.closeIdleConnections(), 100).unref();
    setTimeout(() => {
      log.warn("some requests were cut off");
      process.exit(0);
    }, longestDrainMs).unref();
  };
  for (const signal of ["SIGTERM", "SIGINT", "SIGHUP"]) process.on(signal, () => stop(signal));
  if (process.connected) process.on("disconnect", () => stop("the starting process is gone"));
  return { isStopping: () => isStopping };
}
