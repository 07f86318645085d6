// Both fakes in one process, so that a fault of theirs never takes the api along. Options come as JSON in the first argument.
import { startMail } from './mail.mjs';
import { startObjectStore } from './object-store.mjs';

const { objectStore, mail } = JSON.parse(process.argv[2] ?? '{}');
const running = await Promise.all([startObjectStore(objectStore), startMail(mail)]);
process.send?.({ ready: true });

for (const signal of ['SIGTERM', 'SIGINT']) {
  process.once(signal, async () => {
    await Promise.all(running.map((fake) => fake.stop()));
    process.exit(0);
  });
}
