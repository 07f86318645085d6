// Puts the demo shop into a fresh database. npm start runs this once; the last line it prints says how to sign in.
import { seedDemoShop } from './seed-demo-shop';
import { readSeedSettings } from './settings';

async function main(): Promise<void> {
  const signIns = await seedDemoShop(readSeedSettings(process.env));
  process.stdout.write(`${JSON.stringify(signIns)}\n`);
}

main().catch((error: unknown) => {
  console.error(error);
  process.exitCode = 1;
});
