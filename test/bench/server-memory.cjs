// Loaded into the server's program by the bench: at a signal it collects the garbage and writes its memory to a file.
const { renameSync, writeFileSync } = require('node:fs');

process.on('SIGUSR2', () => {
  globalThis.gc();
  const file = process.env.STOKEHOLD_BENCH_MEMORY;
  writeFileSync(`${file}.part`, JSON.stringify(process.memoryUsage()));
  renameSync(`${file}.part`, file);
});
