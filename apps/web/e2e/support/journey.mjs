import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { openAs } from './person.mjs';

/** Where a failed step leaves what everybody saw; without it nothing is kept. */
const FAILURES = process.env.PROOFPLATE_FAILURES;

/** Runs a journey: tells each step, fails on whatever a page must never do, and closes every browser. */
export async function journey(work) {
  const people = [];
  const open = async (name, options) => {
    const person = await openAs(name, options);
    people.push(person);
    return person;
  };
  try {
    await work({ step, open });
  } catch (error) {
    await keepPictures(people);
    throw error;
  } finally {
    const findings = people.flatMap(({ name, findings: list }) => list().map((finding) => `${name}: ${finding}`));
    await Promise.all(people.map(({ close }) => close()));
    if (findings.length > 0) {
      console.error(findings.join('\n'));
      process.exitCode = 1;
    }
  }
}

async function step(title, work) {
  const startedAt = performance.now();
  try {
    const result = await work();
    console.log(`    ${title} (${((performance.now() - startedAt) / 1000).toFixed(1)} s)`);
    return result;
  } catch (error) {
    console.error(`    failed: ${title}`);
    throw error;
  }
}

async function keepPictures(people) {
  if (FAILURES === undefined) return;
  mkdirSync(FAILURES, { recursive: true });
  await Promise.all(people.map(({ name, page }) => page.screenshot({ path: join(FAILURES, `${name}.png`) }).catch(() => undefined)));
}
