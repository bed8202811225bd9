// Loaded before a command (`node --import`): tells at its end what it took of the machine.
process.on('exit', () => {
  const { userCPUTime, systemCPUTime, maxRSS } = process.resourceUsage();
  process.stderr.write(`\nusage ${(userCPUTime + systemCPUTime) / 1e6} s ${maxRSS / 1024} MiB\n`);
});
