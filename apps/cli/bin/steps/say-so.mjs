// Runs a program without its output and says every so often that it is still at work: say-so.mjs EVERY_MS WORDS PROGRAM ARGUMENTS…
import { spawn } from 'node:child_process';

const [everyMs, words, program, ...args] = process.argv.slice(2);
const begun = Date.now();
const ticking = setInterval(() => console.log(`${words}: ${Math.round((Date.now() - begun) / 1000)} s …`), Number(everyMs));
const running = spawn(program, args, { stdio: ['ignore', 'ignore', 'inherit'] });
running.on('error', (error) => {
  console.error(error.message);
  clearInterval(ticking);
  process.exitCode = 1;
});
running.on('exit', (code) => {
  clearInterval(ticking);
  process.exitCode = code ?? 1;
});
